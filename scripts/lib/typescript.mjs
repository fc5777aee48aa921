/** The command that runs one of the project's TypeScript programs outside Next. */
export function typescriptCommand(file) {
  return [process.execPath, ['--import', 'tsx', file]]
}
