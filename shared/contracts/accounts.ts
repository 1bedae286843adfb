import { z } from 'zod';
import { id, instant, shortText } from './common';
import { endpoint } from './endpoint';
import { EVERYONE, MANAGER, roleSchema } from './roles';

export const email = z
  .string()
  .trim()
  .toLowerCase()
  .pipe(z.email('Enter an e-mail address such as name@laboratory.example.'))
  .pipe(z.string().max(254));
/** bcrypt reads 72 bytes; longer passwords are turned away rather than cut. */
export const password = z
  .string()
  .min(10, 'Use at least 10 characters.')
  .refine((p) => new TextEncoder().encode(p).length <= 72, 'Use at most 72 bytes.');

export const membershipSchema = z.object({
  id,
  laboratoryId: id,
  laboratoryName: z.string(),
  role: roleSchema,
});
export const userSchema = z.object({ id, name: z.string(), email: z.string() });
export const sessionSchema = z.object({
  accessToken: z.string(),
  /** Seconds from now until the access token ends. */
  expiresInSeconds: z.number().int(),
  user: userSchema,
  membership: membershipSchema,
  memberships: z.array(membershipSchema),
});
export type Session = z.infer<typeof sessionSchema>;

export const registerBody = z.object({
  laboratoryName: shortText('the name of the laboratory'),
  name: shortText('your name'),
  email,
  password,
});
export const signInBody = z.object({ email, password: z.string().min(1, 'Enter your password.') });
export const forgotBody = z.object({ email });
export const resetBody = z.object({ token: z.string().min(1), password });
export const changePasswordBody = z.object({
  currentPassword: z.string().min(1, 'Enter the password you use now.'),
  newPassword: password,
});

export const personSchema = z.object({
  membershipId: id,
  userId: id,
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  clientId: id.nullable(),
  active: z.boolean(),
  createdAt: instant,
});
export const invitationSchema = z.object({
  id,
  email: z.string(),
  role: roleSchema,
  clientId: id.nullable(),
  invitedBy: z.string(),
  createdAt: instant,
  expiresAt: instant,
});
export const inviteBody = z
  .object({ email, role: roleSchema, clientId: id.nullable().default(null) })
  .refine((b) => (b.role === 'client') === (b.clientId !== null), {
    path: ['clientId'],
    error: 'Choose the client this person belongs to; only people of a client have one.',
  });
export const acceptBody = z.object({ token: z.string().min(1), name: shortText('your name'), password });

/** What the sign-in page may know before anybody is signed in. */
export const welcomeSchema = z.object({
  demo: z.boolean(),
  signIns: z.array(z.object({ role: roleSchema, name: z.string(), email: z.string(), password: z.string() })),
  /** True where the fake inbox stands in for a mail service. */
  inbox: z.boolean(),
});
export const inboxMailSchema = z.object({
  id: z.string(),
  receivedAt: instant,
  to: z.string(),
  subject: z.string(),
  text: z.string(),
});

export const accountEndpoints = {
  welcome: endpoint({
    method: 'get',
    path: '/welcome',
    summary: 'What the sign-in page shows',
    access: 'public',
    answer: welcomeSchema,
  }),
  register: endpoint({
    method: 'post',
    path: '/laboratories',
    summary: 'Register a laboratory; the caller becomes its manager',
    access: 'public',
    body: registerBody,
    answer: sessionSchema,
  }),
  signIn: endpoint({
    method: 'post',
    path: '/session',
    summary: 'Sign in',
    access: 'public',
    body: signInBody,
    answer: sessionSchema,
    status: 200,
  }),
  refresh: endpoint({
    method: 'post',
    path: '/session/refresh',
    summary: 'New access token for the refresh cookie',
    access: 'cookie',
    answer: sessionSchema,
    status: 200,
  }),
  signOut: endpoint({ method: 'delete', path: '/session', summary: 'Sign out', access: 'cookie' }),
  switchLaboratory: endpoint({
    method: 'post',
    path: '/session/laboratory',
    summary: 'Go on in another laboratory one belongs to',
    access: EVERYONE,
    body: z.object({ laboratoryId: id }),
    answer: sessionSchema,
    status: 200,
  }),
  forgot: endpoint({
    method: 'post',
    path: '/password-resets',
    summary: 'Send a mail to set a new password; the answer never tells whether the address is known',
    access: 'public',
    body: forgotBody,
    status: 202,
  }),
  reset: endpoint({
    method: 'put',
    path: '/password-resets',
    summary: 'Set a new password with the token of the mail',
    access: 'public',
    body: resetBody,
  }),
  changePassword: endpoint({
    method: 'put',
    path: '/account/password',
    summary: 'Change the password; every other session ends',
    access: EVERYONE,
    body: changePasswordBody,
  }),
  updateAccount: endpoint({
    method: 'patch',
    path: '/account',
    summary: 'Change the own name',
    access: EVERYONE,
    body: z.object({ name: shortText('your name') }),
    answer: userSchema,
  }),
  people: endpoint({
    method: 'get',
    path: '/people',
    summary: 'People of the laboratory',
    access: MANAGER,
    answer: z.array(personSchema),
  }),
  updatePerson: endpoint({
    method: 'patch',
    path: '/people/:membershipId',
    summary: 'Change a role, or end or restore access',
    access: MANAGER,
    params: z.object({ membershipId: id }),
    body: z.object({ role: roleSchema.optional(), active: z.boolean().optional() }),
    answer: personSchema,
  }),
  invitations: endpoint({
    method: 'get',
    path: '/invitations',
    summary: 'Invitations not yet taken up',
    access: MANAGER,
    answer: z.array(invitationSchema),
  }),
  invite: endpoint({
    method: 'post',
    path: '/invitations',
    summary: 'Invite a person by mail',
    access: MANAGER,
    body: inviteBody,
    answer: invitationSchema,
  }),
  withdrawInvitation: endpoint({
    method: 'delete',
    path: '/invitations/:invitationId',
    summary: 'Withdraw an invitation',
    access: MANAGER,
    params: z.object({ invitationId: id }),
  }),
  invitation: endpoint({
    method: 'get',
    path: '/invitations/token/:token',
    summary: 'What an invitation offers',
    access: 'public',
    params: z.object({ token: z.string() }),
    answer: z.object({ laboratoryName: z.string(), email: z.string(), role: roleSchema, knownPerson: z.boolean() }),
  }),
  acceptInvitation: endpoint({
    method: 'post',
    path: '/invitations/accept',
    summary: 'Take up an invitation; a known person gives the password they have',
    access: 'public',
    body: acceptBody,
    answer: sessionSchema,
    status: 200,
  }),
  inbox: endpoint({
    method: 'get',
    path: '/inbox',
    summary: 'Mail caught by the local fake; only in demo mode',
    access: 'public',
    answer: z.array(inboxMailSchema),
  }),
  health: endpoint({
    method: 'get',
    path: '/health',
    summary: 'Whether the service and its database answer',
    access: 'public',
    answer: z.object({ ok: z.boolean(), database: z.boolean() }),
  }),
};
