import type { Metadata } from 'next';
import { WalkScreen } from '@/components/walk/walk-screen';

export const metadata: Metadata = { title: 'Walk' };

/** One address for every inspection: the id stands in the fragment and is read only in the browser. */
export default function WalkPage() {
  return <WalkScreen />;
}
