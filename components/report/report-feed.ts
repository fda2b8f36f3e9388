import type { FeedNode } from '@/components/drawings/feed-symbols';
import type { FeedWords } from '@/components/drawings/feed';
import type { ReportMessages } from '@/lib/messages/en-report';
import type { ReportSnapshot, SnapshotCircuit } from '@/lib/schemas/snapshot';

type Panel = ReportSnapshot['panels'][number];
type Feed = SnapshotCircuit['feeds'][number];
/** More would make a drawing higher than a page. */
const MOST_RECEPTACLES = 9;

/** One panel as trees for the feed drawing, a few circuits in each; circuits that were not traced stand in the table only. */
export function feedTrees({ circuits }: ReportSnapshot, panel: Panel, messages: ReportMessages): FeedNode[] {
  const trees: { node: FeedNode; receptacles: number }[] = [];
  for (const circuit of circuits.filter(({ panelId, feeds }) => panelId === panel.id && feeds.length > 0)) {
    const breaker = breakerNode(circuit, messages);
    const last = trees.at(-1);
    if (last && last.receptacles + circuit.feeds.length <= MOST_RECEPTACLES) {
      last.node.feeds.push(breaker);
      last.receptacles += circuit.feeds.length;
      continue;
    }
    const node: FeedNode = { kind: 'panel', name: panel.name, note: panel.place ?? '', feeds: [breaker] };
    trees.push({ node, receptacles: circuit.feeds.length });
  }
  return trees.map(({ node }) => node);
}

export function feedWords(panel: Panel, { circuits }: ReportMessages): FeedWords {
  return { title: circuits.drawing(panel.name), off: circuits.off.toUpperCase(), through: circuits.through };
}

function breakerNode(circuit: SnapshotCircuit, messages: ReportMessages): FeedNode {
  const { breaker, amps, labelAsFound, feeds } = circuit;
  const known = new Set(feeds.map(({ receptacleId }) => receptacleId));
  const first = feeds.filter(({ fedFromReceptacleId: from }) => !from || !known.has(from));
  const nodes = first.map((feed) => feedNode(feed, feeds, messages, []));
  const drawn = new Set(nodes.flatMap(placesOf));
  // Receptacles that name each other hang on nothing; they are shown, without what feeds them.
  const lost = feeds.filter(({ place }) => !drawn.has(place));
  return {
    kind: 'breaker',
    name: amps ? `${breaker} · ${amps} A` : breaker,
    note: labelAsFound || messages.circuits.blank,
    feeds: [...nodes, ...lost.map((feed) => feedNode(feed, [], messages, []))],
  };
}

/** `above` keeps a circle from running for ever. */
function feedNode(feed: Feed, feeds: Feed[], messages: ReportMessages, above: string[]): FeedNode {
  const path = [...above, feed.receptacleId];
  const fed = feeds.filter(
    ({ fedFromReceptacleId: from, receptacleId }) => from === feed.receptacleId && !path.includes(receptacleId),
  );
  return {
    kind: feed.device === 'hard-wired-outlet' ? 'hardwired' : 'receptacle',
    name: feed.place,
    note: [feed.device === 'hard-wired-outlet' ? '' : feed.pattern, messages.device[feed.device]]
      .filter(Boolean)
      .join(', '),
    pattern: feed.pattern,
    device: feed.device,
    off: feed.off,
    feeds: fed.map((next) => feedNode(next, feeds, messages, path)),
  };
}

function placesOf(node: FeedNode): string[] {
  return [node.name, ...node.feeds.flatMap(placesOf)];
}
