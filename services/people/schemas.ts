import { z } from 'zod';
import { type Role, roles } from '../access';
import { PersonId } from '../ids';
import type { Instant } from '../time';
import { normaliseEmail, passwordFault, passwordLength } from './rules';

/** An address in the one form in which it is stored and compared. */
export const Email = z.string('Write an address such as ada@school.example.').transform((text, context) => {
  const address = normaliseEmail(text);
  if (address !== null) return address;
  context.addIssue({
    code: 'custom',
    message: 'Not an address a mail can reach. Write it plainly, such as ada@school.example.',
  });
  return z.NEVER;
});

export const PersonName = z
  .string('Write the name.')
  .transform((text) => text.normalize('NFC').replace(/\s+/g, ' ').trim())
  .pipe(
    z
      .string()
      .min(1, 'Write the name as it should stand on a packing slip.')
      .max(80, 'At most 80 characters.')
      .regex(/^[^\p{Cc}\p{Cf}<>]*$/u, 'Letters, spaces and ordinary signs only.'),
  );

/** A password somebody types to come in: any text, untouched. Its rules are checked where it is chosen. */
const TypedPassword = z
  .string('Write the password.')
  .min(1, 'Write the password.')
  .max(1024, 'That is no password of ours.');

const chosen = (kind: 'staff' | 'customer') =>
  z.string('Choose a password.').superRefine((password, context) => {
    const fault = passwordFault(password, kind);
    if (fault !== null) context.addIssue({ code: 'custom', message: fault });
  });

export const StaffPassword = chosen('staff');
export const CustomerPassword = chosen('customer');

/** Six figures; a space in the middle, as some authenticators show it, is fine. */
export const Code = z
  .string('Write the six figures.')
  .transform((text) => text.replace(/\s/g, ''))
  .pipe(z.string().regex(/^\d{6}$/, 'The code has six figures. Read it from your authenticator.'));

export const Roles = z
  .array(z.enum(roles))
  .min(1, 'Choose at least one role.')
  .transform((list) => roles.filter((role) => list.includes(role)));

/** Where a try comes from: counted against guessing, never stored in clear. */
export const Origin = z.strictObject({ address: z.string().max(200), device: z.string().max(200).nullable() });
export type Origin = z.infer<typeof Origin>;

export const SignIn = z.strictObject({
  email: Email,
  password: TypedPassword,
  code: z.union([z.literal(''), Code]),
});
export type SignIn = z.input<typeof SignIn>;

export const CreateAccount = z.strictObject({ name: PersonName, email: Email });
export type CreateAccount = z.input<typeof CreateAccount>;

export const AskForLink = z.strictObject({ email: Email });
export type AskForLink = z.input<typeof AskForLink>;

export const Token = z.string().regex(/^[\w-]{43}$/, 'This link is not complete. Open it from the mail once more.');

export const UseLink = z.strictObject({ token: Token, forgetPassword: z.boolean() });
export type UseLink = z.input<typeof UseLink>;

export const InviteStaff = z.strictObject({
  name: PersonName,
  email: Email,
  roles: Roles,
  code: z.union([z.literal(''), Code]),
});
export type InviteStaff = z.input<typeof InviteStaff>;

export const AcceptInvitation = z.strictObject({ token: Token, password: StaffPassword, code: Code });
export type AcceptInvitation = z.input<typeof AcceptInvitation>;

export const ChangeRoles = z.strictObject({
  personId: PersonId,
  roles: Roles,
  /** Signing in is off; the person's work and name stay. */
  disabled: z.boolean(),
  code: z.union([z.literal(''), Code]),
});
export type ChangeRoles = z.input<typeof ChangeRoles>;

export const SendNewWayIn = z.strictObject({ personId: PersonId, code: z.union([z.literal(''), Code]) });
export type SendNewWayIn = z.input<typeof SendNewWayIn>;

export const ChangePassword = z
  .strictObject({
    /** Empty while the account has no password yet. */
    current: z.string().max(1024),
    next: z.string('Choose a password.').min(passwordLength.staff, `At least ${passwordLength.staff} characters.`),
  })
  .refine((input) => input.current !== input.next, {
    path: ['next'],
    message: 'This is the password you have. Choose another one.',
  });
export type ChangePassword = z.input<typeof ChangePassword>;

export const AddPerson = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('staff'),
    name: PersonName,
    email: Email,
    roles: Roles,
    password: StaffPassword,
    /** Base32 secret of the second factor; made when left out. */
    secret: z
      .string()
      .regex(/^[A-Z2-7]{32}$/)
      .optional(),
  }),
  z.strictObject({
    kind: z.literal('customer'),
    name: PersonName,
    email: Email,
    password: CustomerPassword.optional(),
  }),
]);
export type AddPerson = z.input<typeof AddPerson>;

export interface PersonView {
  id: PersonId;
  kind: 'staff' | 'customer';
  name: string;
  email: string;
  roles: readonly Role[];
  createdAt: Instant;
  disabledAt: Instant | null;
}

export interface InvitationView {
  id: string;
  name: string;
  email: string;
  roles: readonly Role[];
  invitedBy: string;
  expiresAt: Instant;
}

export interface PeopleView {
  staff: readonly PersonView[];
  invitations: readonly InvitationView[];
  /** The yard asks for a fresh code before rights change hands. */
  needsCode: boolean;
}

export interface AccountView extends PersonView {
  hasPassword: boolean;
}

/** What the page of an open invitation shows: who is meant, and the second factor to enrol. */
export interface EnrolmentView {
  name: string;
  email: string;
  roles: readonly Role[];
  expiresAt: Instant;
  secret: string;
  /** Opens an authenticator on the same device. */
  uri: string;
  qr: QrView;
}

/** A code of `size` by `size` squares, its dark ones as one SVG path. */
export interface QrView {
  size: number;
  path: string;
}

export interface ChangeView {
  seq: number;
  at: Instant;
  who: string;
  action: string;
  subject: { kind: string; id: string };
  before: string | null;
  after: string | null;
  reason: string | null;
  hash: string;
}

export const ListChanges = z.strictObject({
  /** Only lines older than this one. */
  before: z.coerce.number().int().positive().optional(),
  subjectKind: z.string().max(40).optional(),
  subjectId: z.string().max(80).optional(),
});
export type ListChanges = z.input<typeof ListChanges>;

export interface ChangesView {
  changes: readonly ChangeView[];
  /** Where the next older page begins; null at the first line ever written. */
  older: number | null;
}
