/** npm's own program if npm started us, else the one on the path. */
export function npmCommand(args) {
  const npm = process.env['npm_execpath']
  return npm && /npm-cli\.c?js$/.test(npm) ? [process.execPath, [npm, ...args]] : ['npm', args]
}
