'use client';

import { useRouter } from 'next/navigation';
import { useRef, useState, type PointerEvent } from 'react';
import { Button } from '@/components/ui/button';

const WIDTH = 960;
const HEIGHT = 320;

/** Draws with finger, pen or mouse. Who cannot draw uploads a picture, or signs with the typed name alone. */
export function SignaturePad() {
  const canvas = useRef<HTMLCanvasElement>(null);
  const router = useRouter();
  const [isDrawn, setIsDrawn] = useState(false);
  const [says, setSays] = useState('');

  function draw(event: PointerEvent<HTMLCanvasElement>) {
    const brush = canvas.current?.getContext('2d');
    if (!brush || event.buttons === 0) return;
    const box = event.currentTarget.getBoundingClientRect();
    const x = ((event.clientX - box.left) / box.width) * WIDTH;
    const y = ((event.clientY - box.top) / box.height) * HEIGHT;
    if (event.type === 'pointerdown') {
      event.currentTarget.setPointerCapture(event.pointerId);
      brush.lineWidth = 5;
      brush.lineCap = brush.lineJoin = 'round';
      brush.strokeStyle = '#1d1a15';
      brush.beginPath();
      brush.moveTo(x, y);
    }
    brush.lineTo(x, y);
    brush.stroke();
    setIsDrawn(true);
  }

  function clear() {
    canvas.current?.getContext('2d')?.clearRect(0, 0, WIDTH, HEIGHT);
    setIsDrawn(false);
  }

  async function save() {
    setSays('Working…');
    const picture = await new Promise<Blob | null>((resolve) => canvas.current?.toBlob(resolve, 'image/png'));
    if (!picture) return setSays('The drawing could not be read. Draw it again.');
    const form = new FormData();
    form.set('picture', picture, 'signature.png');
    const response = await fetch('/people/me/signature', { method: 'POST', body: form }).catch(() => null);
    if (!response?.ok) return setSays('Not saved. No connection; the drawing is still here.');
    clear();
    setSays('');
    router.push('/people/me?notice=signature-saved');
    router.refresh();
  }

  return (
    <div className="grid gap-2">
      <p id="pad-says" className="text-s font-bold">
        Sign in the box with a finger, a pen or the mouse
      </p>
      <canvas
        ref={canvas}
        width={WIDTH}
        height={HEIGHT}
        role="img"
        aria-labelledby="pad-says"
        className="aspect-[3] w-full touch-none border border-rule bg-[#fff]"
        onPointerDown={draw}
        onPointerMove={draw}
      />
      <p className="flex flex-wrap items-center gap-3">
        <Button type="button" disabled={!isDrawn} onClick={() => void save()}>
          Use this signature
        </Button>
        <Button weight="plain" type="button" disabled={!isDrawn} onClick={clear}>
          Clear
        </Button>
        <span role="status">{says}</span>
      </p>
    </div>
  );
}
