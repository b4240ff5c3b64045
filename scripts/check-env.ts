import { EnvError, parseEnv } from "../lib/env";

// Says what is wrong with the settings before anything is started with them.
try {
  parseEnv(process.env);
} catch (error) {
  if (!(error instanceof EnvError)) throw error;
  console.error(error.message);
  process.exitCode = 1;
}
