import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { id, text } from './http/fields.ts';
import { Role } from './words/roles.ts';

export const TemperatureUnit = z.enum(['celsius', 'fahrenheit']);
export type TemperatureUnit = z.infer<typeof TemperatureUnit>;
export const MassUnit = z.enum(['gram', 'ounce']);
export type MassUnit = z.infer<typeof MassUnit>;

export const Email = z
  .string({ error: 'E-mail address must be text' })
  .max(254, 'E-mail address is too long')
  .trim()
  .pipe(z.email({ error: 'E-mail address must look like name@example.com' }));

/** Any characters, taken as typed; length is what counts. */
export const NewPassword = z
  .string({ error: 'Password must be text' })
  .min(12, 'Password must have at least 12 characters')
  .max(128, 'Password must have at most 128 characters')
  .refine((value) => !value.includes('\u0000') && value.isWellFormed(), 'Password holds characters that cannot be typed again');

export const SignIn = z.strictObject({
  email: z.string({ error: 'E-mail address must be text' }).trim().min(1, 'Type your e-mail address').max(254, 'E-mail address is too long'),
  password: z.string({ error: 'Password must be text' }).min(1, 'Type your password').max(128, 'Password is too long'),
  /** For somebody in several workshops; the one used last otherwise. */
  workshopId: z.uuid().optional(),
});
export type SignIn = z.infer<typeof SignIn>;

export const SignUp = z.strictObject({
  workshopId: id,
  workshopName: text('Workshop name', 120),
  name: text('Your name', 120),
  email: Email,
  password: NewPassword,
  timeZone: z.string().max(60).default('Europe/London'),
});
export type SignUp = z.infer<typeof SignUp>;

/** Who acts, where, and how they like their units. */
export const SessionView = z.object({
  member: z.object({ id: z.string(), name: z.string(), role: Role }),
  account: z.object({ id: z.string(), email: z.string(), name: z.string(), temperatureUnit: TemperatureUnit, massUnit: MassUnit, singleKeys: z.boolean() }),
  workshop: z.object({ id: z.string(), name: z.string(), timeZone: z.string(), currency: z.string(), isDemo: z.boolean() }),
  workshops: z.array(z.object({ id: z.string(), name: z.string(), role: Role })),
});
export type SessionView = z.infer<typeof SessionView>;

export const OpenSession = z.object({ key: z.string(), device: z.string(), signedInAt: z.string(), lastSeenAt: z.string(), isThisOne: z.boolean() });
export type OpenSession = z.infer<typeof OpenSession>;

export const Preferences = z.strictObject({ temperatureUnit: TemperatureUnit, massUnit: MassUnit, singleKeys: z.boolean() });
export type Preferences = z.infer<typeof Preferences>;

export const AskReset = z.strictObject({ email: Email });
export const ResetPassword = z.strictObject({ token: z.string().min(20).max(100), password: NewPassword });
export type ResetPassword = z.infer<typeof ResetPassword>;
export const ChangePassword = z.strictObject({ current: z.string().min(1, 'Type your current password').max(128), password: NewPassword });
export type ChangePassword = z.infer<typeof ChangePassword>;

/** Shown on the sign-in page of a demo only. */
export const DemoAccounts = z.object({
  password: z.string(),
  accounts: z.array(z.object({ email: z.string(), name: z.string(), role: Role, workshop: z.string() })),
});
export type DemoAccounts = z.infer<typeof DemoAccounts>;

export const sessionApi = {
  signIn: endpoint({ method: 'post', path: '/api/session', summary: 'Sign in', right: 'public', body: SignIn, reply: SessionView }),
  whoAmI: endpoint({ method: 'get', path: '/api/session', summary: 'Who am I', right: 'account', reply: SessionView }),
  signOut: endpoint({ method: 'delete', path: '/api/session', summary: 'Sign out', right: 'account' }),
  switchWorkshop: endpoint({ method: 'put', path: '/api/session/workshop', summary: 'Work in another of my workshops', right: 'account', body: z.strictObject({ workshopId: z.uuid() }), reply: SessionView }),
  signUp: endpoint({ method: 'post', path: '/api/sign-up', summary: 'Make a workshop with its owner', right: 'public', body: SignUp, reply: z.object({ accepted: z.literal(true) }) }),
  askReset: endpoint({ method: 'post', path: '/api/password-reset', summary: 'Ask for a mail to set a new password', right: 'public', body: AskReset, reply: z.object({ accepted: z.literal(true) }) }),
  resetPassword: endpoint({ method: 'put', path: '/api/password-reset', summary: 'Set a new password by a mailed link', right: 'public', body: ResetPassword, reply: z.object({ accepted: z.literal(true) }) }),
  changePassword: endpoint({ method: 'put', path: '/api/session/password', summary: 'Change my password; all my other sessions end', right: 'account', body: ChangePassword, reply: z.object({ accepted: z.literal(true) }) }),
  setPreferences: endpoint({ method: 'put', path: '/api/session/preferences', summary: 'How I like units and keys', right: 'account', body: Preferences, reply: SessionView }),
  openSessions: endpoint({ method: 'get', path: '/api/session/all', summary: 'My open sessions', right: 'account', reply: z.object({ items: z.array(OpenSession) }) }),
  endSession: endpoint({ method: 'delete', path: '/api/session/all/:key', summary: 'End one of my sessions', right: 'account', params: z.object({ key: z.string().regex(/^[\da-f]{64}$/) }) }),
  demoAccounts: endpoint({ method: 'get', path: '/api/demo-accounts', summary: 'Accounts of the demo, outside production', right: 'public', reply: DemoAccounts }),
};
