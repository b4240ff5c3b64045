import { closeDatabase } from "@/db/client";
import { verifyChains } from "@/lib/audit/verify-chain";

const report = await verifyChains(process.argv[2]);
for (const fault of report.faults) {
  console.log(`${fault.chain}, entry ${fault.position}: ${fault.says}`);
}
console.log(
  report.faults.length === 0
    ? `${report.eventCount} entries in ${report.chainCount} chains fit.`
    : `${report.faults.length} of ${report.chainCount} chains do not fit.`,
);
await closeDatabase();
process.exitCode = report.faults.length === 0 ? 0 : 1;
