/** What ordering needs of a phone's tap; the wire's `RunEvent` fits. */
export interface DeviceEvent {
  id: string;
  deviceId: string;
  deviceSeq: number;
  /** The phone's clock at the tap, ISO instant. */
  deviceAt: string;
  /** Milliseconds the server's clock was ahead of the phone's then. */
  offsetMs: number;
}

export interface OrderedEvent<E> {
  event: E;
  /** Corrected instant, epoch ms, never before an earlier tap of the same device. */
  atMs: number;
}

/**
 * One order for a set of taps however they arrived: `deviceSeq` within a device; devices merged by
 * monotone corrected time (deviceAt + offsetMs), then id. An id counts once.
 */
export function orderEvents<E extends DeviceEvent>(events: readonly E[]): OrderedEvent<E>[] {
  const lanes = [...byDevice(onePerId(events)).values()].map(monotone);
  const heads = lanes.map(() => 0);
  const ordered: OrderedEvent<E>[] = [];
  for (;;) {
    let chosen = -1;
    for (const [lane, list] of lanes.entries()) {
      const head = list[heads[lane]!];
      if (!head) continue;
      const best = chosen < 0 ? undefined : lanes[chosen]![heads[chosen]!];
      if (!best || isBefore(head, best)) chosen = lane;
    }
    if (chosen < 0) return ordered;
    ordered.push(lanes[chosen]![heads[chosen]!]!);
    heads[chosen]! += 1;
  }
}

function isBefore<E extends DeviceEvent>(a: OrderedEvent<E>, b: OrderedEvent<E>): boolean {
  return a.atMs !== b.atMs ? a.atMs < b.atMs : a.event.id < b.event.id;
}

/** Two different taps never share an id; if they do, the choice must not depend on arrival. */
function onePerId<E extends DeviceEvent>(events: readonly E[]): E[] {
  const kept = new Map<string, E>();
  for (const event of events) {
    const other = kept.get(event.id);
    if (!other || JSON.stringify(event) < JSON.stringify(other)) kept.set(event.id, event);
  }
  return [...kept.values()];
}

function byDevice<E extends DeviceEvent>(events: readonly E[]): Map<string, E[]> {
  const lanes = new Map<string, E[]>();
  for (const event of events) {
    const lane = lanes.get(event.deviceId);
    if (lane) lane.push(event);
    else lanes.set(event.deviceId, [event]);
  }
  return lanes;
}

function monotone<E extends DeviceEvent>(lane: E[]): OrderedEvent<E>[] {
  let latest = Number.NEGATIVE_INFINITY;
  return lane
    .sort((a, b) => a.deviceSeq - b.deviceSeq || (a.id < b.id ? -1 : 1))
    .map((event) => {
      const at = Date.parse(event.deviceAt) + event.offsetMs;
      if (Number.isNaN(at))
        throw new RangeError(
          `deviceAt: '${event.deviceAt}' of event ${event.id} is not an ISO instant`,
        );
      latest = Math.max(latest, at);
      return { event, atMs: latest };
    });
}
