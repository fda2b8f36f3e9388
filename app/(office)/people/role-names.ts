import type { Role } from '@/lib/schemas/roles';

export const ROLE_NAMES: Record<Role, string> = { owner: 'Owner', office: 'Office', inspector: 'Inspector' };
