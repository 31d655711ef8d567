import { z } from 'zod';
import { endpoint } from './http/endpoint.ts';
import { changeOf, recordFields, text } from './http/fields.ts';
import { Email, NewPassword } from './session.ts';
import { Role } from './words/roles.ts';

/** Somebody in the workshop; one without an account (an earlier helper, an imported name) cannot sign in. */
export const MemberView = z.object({ ...recordFields, name: z.string(), role: Role, hasAccount: z.boolean(), hasEnded: z.boolean() });
export type MemberView = z.infer<typeof MemberView>;

export const MemberDetails = MemberView.extend({ email: z.string().nullable() });
export type MemberDetails = z.infer<typeof MemberDetails>;

export const Invite = z.strictObject({ email: Email, name: text('Name', 120), role: Role });
export type Invite = z.infer<typeof Invite>;
export const ChangeMember = changeOf({ name: text('Name', 120), role: Role, hasEnded: z.boolean() });
export type ChangeMember = z.infer<typeof ChangeMember>;

export const Invitation = z.object({ workshopName: z.string(), name: z.string(), email: z.string(), role: Role, hasAccount: z.boolean() });
export type Invitation = z.infer<typeof Invitation>;
export const AcceptInvitation = z.strictObject({ token: z.string().min(20).max(100), name: text('Your name', 120), password: NewPassword });

export type AcceptInvitation = z.infer<typeof AcceptInvitation>;

const params = z.object({ memberId: z.uuid() });

export const membersApi = {
  list: endpoint({ method: 'get', path: '/api/members', summary: 'Members by name, for pickers', right: 'workshop.read', reply: z.object({ items: z.array(MemberView) }) }),
  details: endpoint({ method: 'get', path: '/api/members/details', summary: 'Members with their addresses', right: 'member.manage', reply: z.object({ items: z.array(MemberDetails) }) }),
  invite: endpoint({ method: 'post', path: '/api/invitations', summary: 'Invite somebody by mail', right: 'member.manage', body: Invite, reply: z.object({ accepted: z.literal(true) }) }),
  readInvitation: endpoint({ method: 'get', path: '/api/invitations/:token', summary: 'What an invitation offers', right: 'public', params: z.object({ token: z.string().min(20).max(100) }), reply: Invitation }),
  accept: endpoint({ method: 'post', path: '/api/invitations/accept', summary: 'Join by an invitation', right: 'public', body: AcceptInvitation, reply: z.object({ accepted: z.literal(true), workshopId: z.string() }) }),
  change: endpoint({ method: 'patch', path: '/api/members/:memberId', summary: 'Rename a member, change the role, end the membership', right: 'member.manage', params, body: ChangeMember, reply: MemberDetails, versioned: true }),
};
