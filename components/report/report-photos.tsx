import { Image, Text, View } from '@react-pdf/renderer';
import { timeIn } from '@/lib/messages/dates';
import type { SnapshotPhoto } from '@/lib/schemas/snapshot';
import type { ReportPrint } from './report-context';
import { styles } from './report-styles';

/** The first photo of a finding, beside its drawings. */
export function FigurePhoto({ print, photoId }: { print: ReportPrint; photoId: string }) {
  return (
    <View style={{ flex: 1, maxWidth: 240 }}>
      <Picture print={print} photoId={photoId} height={130} />
    </View>
  );
}

/** The other photos, two beside each other. */
export function PhotoRows({ print, photoIds }: { print: ReportPrint; photoIds: string[] }) {
  const pairs = Array.from({ length: Math.ceil(photoIds.length / 2) }, (_, row) =>
    photoIds.slice(row * 2, row * 2 + 2),
  );
  return pairs.map((pair) => (
    <View key={pair[0]} style={[styles.row, { marginTop: 12 }]} wrap={false}>
      {pair.map((photoId) => (
        <View key={photoId} style={{ width: 256, paddingRight: 12 }}>
          <Picture print={print} photoId={photoId} height={180} />
        </View>
      ))}
    </View>
  ));
}

/** The picture with its number, time and caption. Only bytes from our own store are ever a source. */
function Picture({ print, photoId, height }: { print: ReportPrint; photoId: string; height: number }) {
  const photo = print.snapshot.photos.find((row) => row.id === photoId);
  const bytes = print.photos.get(photoId);
  if (!photo || !bytes) return null;
  return (
    <View>
      <Image src={{ data: bytes, format: 'jpg' }} style={{ height, objectFit: 'contain', objectPosition: '0 100%' }} />
      <Text style={{ fontSize: 8.5, marginTop: 4 }}>
        <Text style={styles.bold}>{photoLine(print, photo)}</Text>
        {photo.caption ? `. ${photo.caption}` : ''}
      </Text>
    </View>
  );
}

function photoLine({ messages, snapshot }: ReportPrint, photo: SnapshotPhoto): string {
  const time = photo.takenAt ? `, ${timeIn(snapshot.inspection.timeZone, photo.takenAt)}` : '';
  return `${messages.finding.photo(photo.number)}${time}`;
}
