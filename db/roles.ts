export { ROLES, type Role } from '@/lib/schemas/roles';
