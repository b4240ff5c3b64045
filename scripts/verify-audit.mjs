/** Checks the audit log's chain of hashes: `npm run -s verify-audit`. */
import { runProjectCommand } from "./lib/project-command.mjs";

runProjectCommand("scripts/verify-audit.ts");
