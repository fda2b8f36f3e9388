'use client';

import './globals.css';

export default function GlobalError({ reset }: { error: Error; reset: () => void }) {
  return (
    <html lang="en">
      <body>
        <main className="mx-auto grid max-w-[44ch] gap-4 px-6 py-16">
          <title>Stopped · Ohmstead</title>
          <h1 className="font-serif text-2xl font-bold">The program stopped on this page</h1>
          <p>
            What was saved before is kept. Try once more; if it stops again, tell the firm’s owner what you were doing.
          </p>
          <p>
            <button type="button" className="button button-solid" onClick={reset}>
              Try once more
            </button>
          </p>
        </main>
      </body>
    </html>
  );
}
