import { z } from 'zod';

export const roles = ['technician', 'reviewer', 'manager', 'client'] as const;
export const roleSchema = z.enum(roles);
export type Role = z.infer<typeof roleSchema>;

/** Everybody who is signed in. */
export const EVERYONE: readonly Role[] = roles;
/** The people of the laboratory. */
export const STAFF: readonly Role[] = ['technician', 'reviewer', 'manager'];
/** Those who take frames. */
export const BENCH: readonly Role[] = ['technician', 'manager'];
/** Those who keep people, benches, cameras and lasers. */
export const MANAGER: readonly Role[] = ['manager'];
