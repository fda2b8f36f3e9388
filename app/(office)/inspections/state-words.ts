import type { InspectionState } from '@/lib/findings/vocabulary';

export const STATE_WORDS: Record<InspectionState, string> = {
  booked: 'Booked',
  'on-site': 'On site',
  'in-review': 'In review',
  released: 'Released',
  closed: 'Closed',
  cancelled: 'Cancelled',
};
