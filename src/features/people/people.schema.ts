import { z } from 'zod';
import { emailSchema, idSchema, lineSchema } from '../../platform/schemas.ts';
import { roles } from '../access/access.types.ts';

export const roleInputSchema = z
  .strictObject({ role: z.enum(roles), squadId: idSchema.optional() })
  .refine(({ role, squadId }) => !(role === 'admin' && squadId !== undefined), {
    path: ['squadId'],
    error: 'nothing: an admin is one of the whole club',
  });
export type RoleInput = z.output<typeof roleInputSchema>;

export const personInputSchema = z.strictObject({
  name: lineSchema(200),
  email: emailSchema,
  roles: z.array(roleInputSchema).max(20).default([]),
});
export type PersonInput = z.output<typeof personInputSchema>;

export const personParamsSchema = z.strictObject({ personId: idSchema });
export const roleParamsSchema = z.strictObject({ personId: idSchema, roleId: idSchema });

export const assignedRoleSchema = z.object({
  id: z.uuid(),
  role: z.enum(roles),
  squadId: z.uuid().nullable(),
});
export const personSchema = z.object({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  roles: z.array(assignedRoleSchema),
});
export const personListSchema = z.object({ items: z.array(personSchema) });

export const meSchema = z.object({
  clubId: z.uuid(),
  person: z.object({ id: z.uuid(), name: z.string(), email: z.string() }),
  roles: z.array(z.object({ role: z.enum(roles), squadId: z.uuid().nullable() })),
  athleteId: z.uuid().nullable(),
});
export type Me = z.output<typeof meSchema>;
