/** What a membership may do; one person can hold several. */
export const ROLES = ['owner', 'office', 'inspector'] as const;
export type Role = (typeof ROLES)[number];
