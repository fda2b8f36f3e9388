import { z } from 'zod';
import { NEC_EDITIONS, STATE_PROFILES } from '@/lib/findings/vocabulary';
import { emailSchema } from './email';
import { ROLES } from './roles';

export type Problem = { field: string; says: string };

/** The first problem of each field, for the summary at the top and the line at the field. */
export function problemsOf(error: z.ZodError): Problem[] {
  const first = new Map<string, Problem>();
  for (const { path, message } of error.issues) {
    const field = path.join('.');
    if (!first.has(field)) first.set(field, { field, says: message });
  }
  return [...first.values()];
}

const personName = requiredText('Enter your full name', 100);
const optionalText = (most: number) =>
  z
    .string()
    .transform(oneLine)
    .pipe(z.string().max(most, `Use at most ${most} characters`))
    .transform((text) => (text === '' ? null : text));

export const signUpSchema = z.object({
  firmName: requiredText('Enter the name of your firm', 120),
  name: personName,
  email: emailSchema,
  password: z.string(),
  stateProfile: z.enum(STATE_PROFILES, 'Choose the state you work in'),
  timeZone: z.string().refine(isTimeZone, 'Choose a time zone'),
});

export const invitationSchema = z.object({
  name: requiredText('Enter the name of the person', 100),
  email: emailSchema,
  roles: z.array(z.enum(ROLES)).min(1, 'Choose at least one role'),
});
export const rolesSchema = invitationSchema.shape.roles;

export const profileSchema = z.object({
  name: personName,
  licenseNumber: optionalText(40),
  licenseState: optionalText(2).refine(
    (text) => text === null || /^[A-Za-z]{2}$/.test(text),
    'Enter the two letters of the state, like OH',
  ),
  licenseExpires: optionalDate('Enter the day the license expires, like 2027-06-30'),
  signatureName: optionalText(100),
});

const addressSchema = z.object({
  street: optionalText(120),
  unit: optionalText(40),
  city: optionalText(80),
  county: optionalText(80),
  state: optionalText(2),
  zip: optionalText(10).refine((text) => text === null || /^\d{5}(-\d{4})?$/.test(text), 'Enter a ZIP like 43004'),
});

export const firmSchema = z.object({
  name: requiredText('Enter the name of your firm', 120),
  address: addressSchema.transform((address, context) => {
    const { street, unit, city, county, state, zip } = address;
    if (Object.values(address).every((part) => part === null)) return null;
    for (const field of ['street', 'city', 'state', 'zip'] as const) {
      if (address[field] === null) context.addIssue({ code: 'custom', path: [field], message: MISSING[field] });
    }
    if (street === null || city === null || state === null || zip === null) return z.NEVER;
    return { street, city, state: state.toUpperCase(), zip, ...(unit ? { unit } : {}), ...(county ? { county } : {}) };
  }),
  phone: optionalText(30),
  email: z.union([z.literal('').transform(() => null), emailSchema], 'Enter an e-mail address, like name@firm.example'),
  licenseNumber: optionalText(40),
  timeZone: z.string().refine(isTimeZone, 'Choose a time zone'),
  stateProfile: z.enum(STATE_PROFILES, 'Choose a state profile'),
  sharedDrafts: z.boolean(),
});

const MISSING = {
  street: 'Enter the street and number',
  city: 'Enter the city or town',
  state: 'Enter the two letters of the state, like OH',
  zip: 'Enter the ZIP',
};

export const adoptionSchema = z.object({
  place: requiredText('Enter the town, county or state that enforces it', 80),
  edition: z
    .string()
    .transform(Number)
    .refine((year) => (NEC_EDITIONS as readonly number[]).includes(year), 'Choose an edition'),
  from: z.iso.date('Enter the day it came into force, like 2019-07-01'),
  source: requiredText('Say where this comes from: an ordinance, or who told you and when', 200),
});

/** The zones that a firm in the United States can be in. */
export const TIME_ZONES = [
  { zone: 'America/New_York', says: 'Eastern' },
  { zone: 'America/Chicago', says: 'Central' },
  { zone: 'America/Denver', says: 'Mountain' },
  { zone: 'America/Phoenix', says: 'Mountain, Arizona' },
  { zone: 'America/Los_Angeles', says: 'Pacific' },
  { zone: 'America/Anchorage', says: 'Alaska' },
  { zone: 'Pacific/Honolulu', says: 'Hawaii' },
  { zone: 'America/Puerto_Rico', says: 'Atlantic, Puerto Rico' },
] as const;

function isTimeZone(zone: string): boolean {
  return TIME_ZONES.some((known) => known.zone === zone);
}

function requiredText(says: string, most: number) {
  return z
    .string(says)
    .transform(oneLine)
    .pipe(z.string().min(1, says).max(most, `Use at most ${most} characters`));
}

function optionalDate(says: string) {
  return z.union([z.literal('').transform(() => null), z.iso.date(says)], says);
}

/** Line breaks in a name would become headers of a mail. */
function oneLine(text: string): string {
  return text
    .normalize('NFC')
    .replace(/[\p{Cc}\p{Zl}\p{Zp}]+/gu, ' ')
    .trim();
}
