/** How a TypeScript file of the project runs outside the web server: one process, no wrapper. */
export function projectScript(file, args = []) {
  return {
    command: process.execPath,
    // With this condition the marker package "server-only" is an empty module.
    args: ["--conditions=react-server", "--import", "tsx", file, ...args],
  };
}
