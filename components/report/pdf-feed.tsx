import { View } from '@react-pdf/renderer';
import { feedDrawing, type FeedWords } from '@/components/drawings/feed';
import type { FeedNode } from '@/components/drawings/feed-symbols';
import { PdfReceptacle } from './pdf-receptacle';

const DRAWN_WIDTH = 720;
const FULL_WIDTH = 525;
const MOST_HEIGHT = 600;

/** The feed drawing in print, as wide as the page or as high as fits on one. */
export function PdfFeed({ tree, words }: { tree: FeedNode; words: FeedWords }) {
  const drawing = feedDrawing(tree, 'columns', DRAWN_WIDTH, words);
  const [, , width, height] = drawing.box;
  return (
    <View wrap={false} style={{ marginVertical: 8 }}>
      <PdfReceptacle drawing={drawing} width={Math.min(FULL_WIDTH, (MOST_HEIGHT * width) / height)} />
    </View>
  );
}
