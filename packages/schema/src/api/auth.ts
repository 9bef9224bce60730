import { z } from 'zod';
import { ROLES } from '../permissions.js';
import { idSchema } from './common.js';

export const roleSchema = z.enum(ROLES);

export const signInRequestSchema = z.strictObject({
  email: z.email().max(254),
  password: z.string().min(1).max(128),
});
export type SignInRequest = z.infer<typeof signInRequestSchema>;

/** One button a demo role. Answered only while the demo workspace is on; signs in to that workspace only. */
export const demoSignInRequestSchema = z.strictObject({ role: roleSchema });

export const demoAccountsSchema = z.object({
  enabled: z.boolean(),
  workspaceName: z.string().nullable(),
  roles: z.array(z.object({ role: roleSchema, name: z.string(), purpose: z.string() })),
});
export type DemoAccounts = z.infer<typeof demoAccountsSchema>;

export const meSchema = z.object({
  user: z.object({ id: idSchema, name: z.string(), email: z.string() }),
  workspace: z.object({ id: idSchema, name: z.string(), isDemo: z.boolean() }),
  role: roleSchema,
});
export type Me = z.infer<typeof meSchema>;

/** Answer to sign-in, demo sign-in and refresh. The refresh token travels in an httpOnly cookie only. */
export const accessSchema = z.object({
  accessToken: z.string(),
  expiresInSeconds: z.int(),
  me: meSchema,
});
export type Access = z.infer<typeof accessSchema>;

export const memberSchema = z.object({
  userId: idSchema,
  name: z.string(),
  email: z.string(),
  role: roleSchema,
});
export type Member = z.infer<typeof memberSchema>;
export const changeRoleRequestSchema = z.strictObject({ role: roleSchema });
