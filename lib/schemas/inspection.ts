import { z } from 'zod';
import { INSPECTION_STATES, STATE_PROFILES, WIRING_METHODS } from '@/lib/findings/vocabulary';
import { idSchema } from './id';

const text = (most: number) => z.string().trim().max(most, `Keep it under ${most} characters`);
const required = (most: number, says: string) => text(most).min(1, says);
const optionalEmail = z.union([z.literal(''), z.email('Check the e-mail address, such as name@mail.example')]);

export const addressSchema = z.object({
  street: required(120, 'Enter the street and number'),
  unit: text(40).optional(),
  city: required(80, 'Enter the city or town'),
  county: text(80).optional(),
  state: z.string().regex(/^[A-Z]{2}$/, 'Choose the state'),
  zip: z
    .string()
    .trim()
    .regex(/^\d{5}(-\d{4})?$/, 'Enter the ZIP code, such as 97000'),
});

/** One schema for the booking form, its action and db/. */
export const newInspectionSchema = z.object({
  address: addressSchema,
  timeZone: z.string().min(1, 'Choose the time zone of the house'),
  stateProfile: z.enum(STATE_PROFILES),
  /** Wall time in the house's time zone, as a browser's date-time field gives it. */
  scheduledLocal: z.string().regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}$/, 'Choose the day and time of the visit'),
  yearBuilt: z
    .int('Enter the year as four digits, or leave it empty')
    .min(1700, 'Check the year: before 1700')
    .max(2100, 'Check the year')
    .optional(),
  wiringMethod: z.enum(WIRING_METHODS),
  leadMembershipId: idSchema,
  buyerName: required(120, 'Enter the buyer’s name'),
  buyerEmail: optionalEmail,
  buyerPhone: text(40).optional(),
  agentName: text(120).optional(),
  agentEmail: optionalEmail,
  occupied: z.boolean().optional(),
  utilitiesOn: z.boolean().optional(),
});
export type NewInspection = z.infer<typeof newInspectionSchema>;

export const INSPECTION_SORTS = ['scheduled-newest', 'scheduled-oldest', 'number-newest', 'number-oldest'] as const;
export type InspectionSort = (typeof INSPECTION_SORTS)[number];

/** Filter of the inspections list, as the address bar and the API carry it. */
export const inspectionFilterSchema = z.object({
  search: z.string().trim().max(120).default(''),
  state: z.enum(INSPECTION_STATES).optional(),
  inspector: idSchema.optional(),
  sort: z.enum(INSPECTION_SORTS).default('scheduled-newest'),
  cursor: z.string().max(200).optional(),
});
export type InspectionFilter = z.infer<typeof inspectionFilterSchema>;

export type InspectionListItem = {
  id: string;
  number: number;
  state: (typeof INSPECTION_STATES)[number];
  address: string;
  city: string;
  buyer: string;
  inspector: string;
  scheduledAt: string;
  timeZone: string;
  yearBuilt: number | null;
};
export type InspectionPage = { items: InspectionListItem[]; nextCursor?: string };
