/** Roles a person can hold; exactly one each. */
export const ROLES = ["requester", "technician", "investigator", "lead", "administrator"] as const;
export type Role = (typeof ROLES)[number];

export const ROLE_NAMES: Record<Role, string> = {
  requester: "Requester",
  technician: "Technician",
  investigator: "Investigator",
  lead: "Lead engineer",
  administrator: "Administrator",
};

export const ORGANISATION_KINDS = ["laboratory", "client"] as const;
export type OrganisationKind = (typeof ORGANISATION_KINDS)[number];

/** Roles a client's people can hold; the others belong to the laboratory. */
export const CLIENT_ROLES: readonly Role[] = ["requester"];

/** Seats of a case and the roles that can take them. */
export const SEATS = ["lead", "investigator", "secondReader", "technician"] as const;
export type Seat = (typeof SEATS)[number];
export const SEAT_ROLES: Record<Seat, readonly Role[]> = {
  lead: ["lead"],
  investigator: ["investigator", "lead"],
  secondReader: ["investigator", "lead"],
  technician: ["technician"],
};
export const SEAT_NAMES: Record<Seat, string> = {
  lead: "Lead engineer",
  investigator: "Investigator",
  secondReader: "Second reader",
  technician: "Technician",
};

export const TOKEN_KINDS = ["invitation", "password-reset"] as const;
export type TokenKind = (typeof TOKEN_KINDS)[number];

export const PASSWORD_MIN_LENGTH = 12;
export const PASSWORD_MAX_LENGTH = 200;
export const INVITATION_VALID_HOURS = 72;
export const PASSWORD_RESET_VALID_HOURS = 2;

/** Role of the person who sets an empty installation up. */
export const FIRST_ROLE: Role = "administrator";

/** Roles whose people handle evidence. */
export const LAB_ROLES: Role[] = ["technician", "investigator", "lead"];
