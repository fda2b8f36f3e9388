import { Path, Rect, Svg, Text, View } from '@react-pdf/renderer';
import type { Signal } from '@/lib/findings/vocabulary';

/** Word, icon and colour; the border tells them apart in black and white. Values near ANSI Z535.1's. */
const LOOK = {
  DANGER: { fill: '#c8102e', text: '#ffffff', width: 1.5, line: 'solid', border: '#1d1a15' },
  WARNING: { fill: '#ff8200', text: '#000000', width: 1.5, line: 'solid', border: '#000000' },
  CAUTION: { fill: '#ffd100', text: '#000000', width: 1.25, line: 'dashed', border: '#000000' },
  NOTICE: { fill: '#0067b9', text: '#ffffff', width: 0.5, line: 'solid', border: '#0067b9' },
} as const satisfies Record<Signal, object>;

export function HazardTag({ signal, word, large = false }: { signal: Signal; word: string; large?: boolean }) {
  const look = LOOK[signal];
  return (
    <View
      style={{
        flexDirection: 'row',
        alignItems: 'center',
        alignSelf: 'flex-start',
        backgroundColor: look.fill,
        borderWidth: look.width,
        borderColor: look.border,
        borderStyle: look.line,
        paddingHorizontal: large ? 8 : 6,
        paddingVertical: large ? 4 : 2.5,
      }}
    >
      <HazardIcon signal={signal} size={large ? 14 : 10} color={look.text} hole={look.fill} />
      <Text
        style={{
          color: look.text,
          fontWeight: 700,
          fontStyle: signal === 'NOTICE' ? 'italic' : 'normal',
          fontSize: large ? 13 : 9,
          lineHeight: 1.2,
          marginLeft: 5,
          letterSpacing: 0.3,
        }}
      >
        {word}
      </Text>
    </View>
  );
}

type IconProps = { signal: Signal; size: number; color: string; hole: string };

/** The alert triangle means injury; NOTICE is not about injury and carries a written sheet. */
function HazardIcon({ signal, size, color, hole }: IconProps) {
  return (
    <Svg width={size} height={size} viewBox="0 0 20 20">
      {signal === 'NOTICE' ? (
        <>
          <Path d="M4 1h9l4 4v14H4z" fill={color} />
          <Path d="M7 9h7M7 12h7M7 15h5" stroke={hole} strokeWidth={1.4} />
        </>
      ) : (
        <>
          <Path d="M10 1 L19.5 18.5 H0.5 Z" fill={color} />
          <Rect x={9} y={7} width={2} height={6} fill={hole} />
          <Rect x={9} y={14.4} width={2} height={2} fill={hole} />
        </>
      )}
    </Svg>
  );
}
