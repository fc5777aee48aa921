/** The command that runs one of the project's TypeScript programs outside Next, as the server code it is. */
export function typescriptCommand(file) {
  return [process.execPath, ['--conditions=react-server', '--import', 'tsx', file]]
}
