'use client';

import { useEffect, useRef, useState, type ReactNode } from 'react';

type Step = { kind: 'by-code' } | { kind: 'opening' } | { kind: 'refused'; says: string };

/** Posts the token of the address, and takes it out of the address and the history before anything else. */
export function OpenLink({ children }: { children: ReactNode }) {
  const [step, setStep] = useState<Step>({ kind: 'by-code' });
  const hasStarted = useRef(false);

  useEffect(() => {
    const token = window.location.hash.slice(1);
    if (hasStarted.current || token === '') return;
    hasStarted.current = true;
    window.history.replaceState(null, '', window.location.pathname);
    void openToken(token, setStep);
  }, []);

  if (step.kind === 'opening') return <p role="status">Opening…</p>;
  return (
    <>
      {step.kind === 'refused' && (
        <p role="alert" className="border-y-2 border-ink py-3 font-bold">
          {step.says}
        </p>
      )}
      {children}
    </>
  );
}

async function openToken(token: string, show: (step: Step) => void): Promise<void> {
  show({ kind: 'opening' });
  try {
    const response = await fetch('/open/exchange', {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({ token }),
    });
    const answer = (await response.json()) as { to?: string; error?: string };
    if (response.ok && answer.to) return window.location.replace(answer.to);
    show({ kind: 'refused', says: answer.error ?? UNREACHABLE });
  } catch {
    show({ kind: 'refused', says: UNREACHABLE });
  }
}

const UNREACHABLE = 'No connection. Nothing was used up: open the link from the mail again.';
