/** Accounts: sign-up, sign-in, roles, invitations. */
import { z } from 'zod';

export const Role = z.enum(['coordinator', 'organiser', 'administrator']);
export type Role = z.infer<typeof Role>;
export const ROLE_LABEL: Record<Role, string> = {
  coordinator: 'Coordinator',
  organiser: 'Organiser',
  administrator: 'Administrator',
};

export const TokenPurpose = z.enum(['confirm-address', 'reset-password', 'invitation']);
export type TokenPurpose = z.infer<typeof TokenPurpose>;

/** Town name → coordinates in degrees, and the region it lies in. */
export const Gazetteer = z.record(
  z.string(),
  z.object({ latitude: z.number().min(-90).max(90), longitude: z.number().min(-180).max(180), region: z.string() }),
);
export type Gazetteer = z.infer<typeof Gazetteer>;

export const EmailAddress = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'At most 254 characters')
  .pipe(z.email('Enter an e-mail address like name@example.org'));

// NIST SP 800-63B-4, 3.1.1.2: at least 15 characters where a password is the only factor; no composition rules.
export const PASSWORD_MIN = 15;
export const PASSWORD_MAX = 200;

/**
 * A password to be set. Common ones are refused: too few different characters, sequences, the product's and the trade's words alone.
 */
export const NewPassword = z
  .string()
  .min(PASSWORD_MIN, `At least ${PASSWORD_MIN} characters; a few unrelated words are a good choice`)
  .max(PASSWORD_MAX, `At most ${PASSWORD_MAX} characters`)
  .refine((value) => !isCommonPassword(value), 'This password is easy to guess; choose one with more unrelated words');

const SEQUENCES = ['abcdefghijklmnopqrstuvwxyz', '01234567890123456789', 'qwertyuiopasdfghjklzxcvbnm'];
const COMMON_WORDS =
  /password|passw0rd|letmein|welcome|iloveyou|monkey|dragon|football|baseball|superman|princess|sunshine|master|admin|login|qwerty|abc|heddle|mentoring|mentor|mentee|changeme|secret|trustno|correcthorsebatterystaple|thequickbrownfox|[0-9]|[^a-z]/g;

/** True where little is left of a password once common words, digits and repetition are taken away. */
export function isCommonPassword(value: string): boolean {
  const lower = value.toLowerCase();
  if (new Set(lower).size < 5) return true;
  if (SEQUENCES.some((run) => run.includes(lower) || run.includes([...lower].reverse().join('')))) return true;
  const half = lower.slice(0, Math.ceil(lower.length / 2));
  if (lower === (half + half).slice(0, lower.length)) return true;
  const latin = /^[\x20-\x7e]*$/.test(lower);
  return latin && lower.replaceAll(COMMON_WORDS, '').length < 3 && !/[^a-z0-9 ].*[^a-z0-9 ].*[^a-z0-9 ]/.test(lower);
}

export const SessionPerson = z.object({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  roles: z.array(Role),
});
export type SessionPerson = z.infer<typeof SessionPerson>;

export const AssociationView = z.object({
  name: z.string(),
  timeZone: z.string(),
  locale: z.string(),
  contactEmail: z.string(),
  towns: z.array(z.object({ name: z.string(), region: z.string() })),
});
export type AssociationView = z.infer<typeof AssociationView>;

export const Session = z.object({
  person: SessionPerson.nullable(),
  association: AssociationView,
  /** True where messages go to the local mailbox, which administrators can read. */
  localMailbox: z.boolean(),
  /** True where the demo association was seeded: sign-ins may be shown. */
  demo: z.boolean(),
});
export type Session = z.infer<typeof Session>;

export const SignIn = z.strictObject({
  email: EmailAddress,
  password: z.string().min(1, 'Enter your password').max(PASSWORD_MAX, `At most ${PASSWORD_MAX} characters`),
});
export type SignIn = z.infer<typeof SignIn>;

export const Registration = z.strictObject({
  name: z.string().trim().min(1, 'Enter your name').max(100, 'At most 100 characters').normalize('NFC'),
  email: EmailAddress,
  password: NewPassword,
  timeZone: z.string().max(60).default(''),
});
export type Registration = z.input<typeof Registration>;

export const AddressOnly = z.strictObject({ email: EmailAddress });
export type AddressOnly = z.infer<typeof AddressOnly>;

export const LinkToken = z.string().regex(/^[A-Za-z0-9_-]{43}$/, 'This link is not complete');
export const TokenOnly = z.strictObject({ token: LinkToken });
export type TokenOnly = z.infer<typeof TokenOnly>;

export const PasswordReset = z.strictObject({ token: LinkToken, password: NewPassword });
export type PasswordReset = z.infer<typeof PasswordReset>;

export const InvitationView = z.object({ purpose: TokenPurpose, email: z.string().nullable(), roles: z.array(Role) });
export type InvitationView = z.infer<typeof InvitationView>;

/** `email` is needed only where the invitation was not sent to an address (the first administrator's). */
export const InvitationAnswer = z.strictObject({
  token: LinkToken,
  name: z.string().trim().min(1, 'Enter your name').max(100, 'At most 100 characters').normalize('NFC'),
  email: EmailAddress.optional(),
  password: NewPassword,
});
export type InvitationAnswer = z.infer<typeof InvitationAnswer>;

/** A sentence saying what happened and what happens next; the same whether or not an address is known. */
export const Outcome = z.object({ message: z.string() });
export type Outcome = z.infer<typeof Outcome>;

export const PersonLine = z.object({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  roles: z.array(Role),
  state: z.enum(['invited', 'registered', 'confirmed', 'disabled']),
  membershipNumber: z.string().nullable(),
  membershipCurrent: z.boolean(),
  createdAt: z.iso.datetime(),
});
export type PersonLine = z.infer<typeof PersonLine>;

export const PeopleQuery = z.object({
  search: z.string().trim().max(100).default(''),
  role: Role.optional(),
  page: z.coerce.number().int().min(1).max(10_000).default(1),
});
export type PeopleQuery = z.input<typeof PeopleQuery>;
export const PeoplePage = z.object({ people: z.array(PersonLine), total: z.int(), page: z.int(), pageSize: z.int() });
export type PeoplePage = z.infer<typeof PeoplePage>;

export const PersonParams = z.object({ personId: z.uuid() });
export const RolesChange = z.strictObject({ roles: z.array(Role).max(3) });
export type RolesChange = z.infer<typeof RolesChange>;

export const Invitation = z.strictObject({
  email: EmailAddress,
  name: z.string().trim().min(1, 'Enter a name').max(100, 'At most 100 characters').normalize('NFC'),
  roles: z.array(Role).max(3),
});
export type Invitation = z.infer<typeof Invitation>;
