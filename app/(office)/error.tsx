'use client';

import { Button } from '@/components/ui/button';

export default function OfficeError({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  return (
    <div role="alert" className="grid max-w-[58ch] gap-4">
      <h1 className="font-serif font-bold text-xl">This page did not load</h1>
      <p>What was saved before is still there. Try again; if it comes back, tell us what you did and this number.</p>
      {error.digest && <p className="text-s">Number {error.digest}</p>}
      <p>
        <Button weight="solid" type="button" onClick={reset}>
          Try again
        </Button>
      </p>
    </div>
  );
}
