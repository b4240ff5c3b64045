import { say } from "./report.mjs";

const PASSWORD = "Riverline-demo-1";
const ACCOUNTS = [
  ["lead engineer", "lead@calderstreet.example"],
  ["lead engineer", "second.lead@calderstreet.example"],
  ["investigator", "investigator@calderstreet.example"],
  ["investigator", "second.investigator@calderstreet.example"],
  ["technician", "technician@calderstreet.example"],
  ["administrator", "admin@calderstreet.example"],
  ["requester", "requester@harrowbay.example"],
  ["requester of another client", "requester@tesselwind.example"],
];

export function sayDemoAccounts() {
  say(`  Demonstration accounts, all with the password ${PASSWORD}`);
  for (const [role, email] of ACCOUNTS) say(`    ${email.padEnd(42)} ${role}`);
}
