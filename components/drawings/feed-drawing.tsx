import { feedDrawing, type FeedWords } from './feed';
import type { FeedNode } from './feed-symbols';
import { ShapeElement } from './shape-element';

const FLOWS = [
  { flow: 'columns', width: 720, className: 'max-sm:hidden' },
  { flow: 'rows', width: 340, className: 'sm:hidden print:hidden' },
] as const;

/** What feeds what: in columns at a desk, in rows on a phone. The screen shows and speaks one of the two. */
export function FeedDrawing({ tree, words }: { tree: FeedNode; words: FeedWords }) {
  return FLOWS.map(({ flow, width, className }) => {
    const { box, shapes, label } = feedDrawing(tree, flow, width, words);
    return (
      <svg
        key={flow}
        role="img"
        aria-label={label}
        viewBox={box.join(' ')}
        width={box[2]}
        height={box[3]}
        className={`h-auto max-w-full font-sans ${className}`}
      >
        {shapes.map((shape, i) => (
          <ShapeElement key={i} shape={shape} line={1.5} />
        ))}
      </svg>
    );
  });
}
