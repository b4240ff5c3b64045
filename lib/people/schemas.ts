import { z } from "zod";
import { CLIENT_ROLES, PASSWORD_MAX_LENGTH, PASSWORD_MIN_LENGTH, ROLES } from "./constants";

const email = z.email("This needs an e-mail address, like name@firm.example.").max(254);
const personName = z.string().trim().min(2, "This needs the person's name.").max(200);

export const newPassword = z
  .string()
  .min(
    PASSWORD_MIN_LENGTH,
    `Use at least ${PASSWORD_MIN_LENGTH} characters. A few words in a row work well.`,
  )
  .max(PASSWORD_MAX_LENGTH, `Use at most ${PASSWORD_MAX_LENGTH} characters.`);

export const InvitePersonInput = z.object({
  name: personName,
  email,
  role: z.enum(ROLES, "Choose a role."),
  organisationId: z.string().min(1, "Choose an organisation."),
});

export const ChangePersonInput = z.object({
  personId: z.string(),
  role: z.enum(ROLES),
  isActive: z.boolean(),
});

export const AddOrganisationInput = z.object({
  name: z.string().trim().min(2, "This needs the client's name.").max(200),
});

export const ForgottenInput = z.object({ email });

export const SetPasswordInput = z.object({
  token: z.string().min(20).max(100),
  password: newPassword,
});

export const ChangeOwnPasswordInput = z.object({
  current: z.string().min(1, "Type your present password.").max(PASSWORD_MAX_LENGTH),
  password: newPassword,
});

export const SetUpInput = z.object({
  laboratoryName: z.string().trim().min(2, "This needs the laboratory's name.").max(200),
  addressLine: z.string().trim().max(300),
  name: personName,
  email,
  password: newPassword,
});

/** Whether a role fits the kind of organisation a person belongs to. */
export function roleFits(role: (typeof ROLES)[number], kind: "laboratory" | "client"): boolean {
  return kind === "laboratory" || CLIENT_ROLES.includes(role);
}
