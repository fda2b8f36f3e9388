import { Image as PdfImage, Text, View } from '@react-pdf/renderer';
import { timeIn } from '@/lib/messages/dates';
import type { SnapshotPhoto } from '@/lib/schemas/snapshot';
import type { ReportPrint } from './report-context';
import { styles } from './report-styles';

/** The first photo of a finding, beside its drawings. */
export function FigurePhoto({ print, photoId }: { print: ReportPrint; photoId: string }) {
  return (
    <View style={{ flex: 1, maxWidth: 240 }}>
      <Picture print={print} photoId={photoId} height={112} />
    </View>
  );
}

/** The other photos, three beside each other. */
export function PhotoRows({ print, photoIds }: { print: ReportPrint; photoIds: string[] }) {
  const rows = Array.from({ length: Math.ceil(photoIds.length / 3) }, (_, row) => photoIds.slice(row * 3, row * 3 + 3));
  return rows.map((row) => (
    <View key={row[0]} style={[styles.row, { marginTop: 12 }]} wrap={false}>
      {row.map((photoId) => (
        <View key={photoId} style={{ width: 175, paddingRight: 12 }}>
          <Picture print={print} photoId={photoId} height={122} />
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
      <PdfImage src={pictureSource(bytes)} style={{ height, objectFit: 'contain', objectPosition: '0 100%' }} />
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

/** Bytes of a picture with what they are, by their first byte: PNG or JPEG, the two that the PDF takes. */
export function pictureSource(data: Buffer): { data: Buffer; format: 'png' | 'jpg' } {
  return { data, format: data[0] === 0x89 ? 'png' : 'jpg' };
}
