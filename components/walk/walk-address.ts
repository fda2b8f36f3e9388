/** What Walk shows stands in the fragment, so that Back works and the shell stays the same page: `/walk#<inspection>/area/<area>`. */
export type WalkView =
  | { kind: 'areas' }
  | { kind: 'area'; areaId: string; receptacleId?: string }
  | { kind: 'result'; receptacleId: string }
  | { kind: 'device'; receptacleId: string }
  | { kind: 'trip'; receptacleId: string }
  | { kind: 'told'; receptacleId: string }
  | { kind: 'photos'; receptacleId: string }
  | { kind: 'still-off' }
  | { kind: 'waiting' };

export type WalkAddress = { inspectionId: string | null; view: WalkView };

const ID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

export function parseAddress(hash: string): WalkAddress {
  const [inspectionId = '', kind = '', id = '', third = ''] = hash.replace(/^#/, '').split('/');
  if (!ID.test(inspectionId)) return { inspectionId: null, view: { kind: 'areas' } };
  return { inspectionId, view: viewOf(kind, id, third) };
}

function viewOf(kind: string, id: string, third: string): WalkView {
  if (kind === 'still-off' || kind === 'waiting') return { kind };
  if (!ID.test(id)) return { kind: 'areas' };
  if (kind === 'area') return { kind, areaId: id, receptacleId: ID.test(third) ? third : undefined };
  if (kind === 'result' || kind === 'device' || kind === 'trip' || kind === 'told' || kind === 'photos')
    return { kind, receptacleId: id };
  return { kind: 'areas' };
}

export function addressOf(inspectionId: string, view: WalkView): string {
  switch (view.kind) {
    case 'areas':
      return `#${inspectionId}`;
    case 'still-off':
    case 'waiting':
      return `#${inspectionId}/${view.kind}`;
    case 'area':
      return `#${inspectionId}/area/${view.areaId}${view.receptacleId ? `/${view.receptacleId}` : ''}`;
    case 'result':
    case 'device':
    case 'trip':
    case 'told':
    case 'photos':
      return `#${inspectionId}/${view.kind}/${view.receptacleId}`;
  }
}

/** Shows a view; Back returns from it. */
export function goTo(inspectionId: string, view: WalkView): void {
  window.location.hash = addressOf(inspectionId, view);
}

/** Goes on from the view that `from` names, unless the person has gone elsewhere while something was being saved. */
export function goOn(from: string, inspectionId: string, view: WalkView): void {
  if (window.location.hash === from) goTo(inspectionId, view);
}
