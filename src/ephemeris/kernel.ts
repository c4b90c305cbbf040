import type { Pair } from "../bodies/pair.ts";
import { type PointId, pointLabel } from "../bodies/point.ts";
import { ApsidaryError } from "../error.ts";
import { commonIntervals } from "../numeric/common-intervals.ts";
import { sha256 } from "./sha256.ts";
import type { Accuracy, Motion, Source, Span } from "./source.ts";
import { addSegmentState, readSpk, type SpkSegment } from "./spk.ts";

/** Segments of one target about one centre, the one that counts most first. */
interface Link {
  readonly target: PointId;
  readonly centre: PointId;
  readonly segments: readonly SpkSegment[];
  readonly spans: readonly Span[];
}

/** A link on the way from the centre of a pair to its moving point; `sign` is −1 where it is walked from target to centre. */
interface Step {
  readonly link: Link;
  readonly sign: 1 | -1;
}

interface Route {
  readonly steps: readonly Step[];
  readonly spans: readonly Span[];
}

/** What a kernel source is called and how far it is trusted. */
export interface KernelIdentity {
  readonly id: string;
  readonly title: string;
  readonly accuracy: (pair: Pair, tdb: number) => Accuracy;
}

/**
 * Opens an SPK kernel as a source.
 *
 * A pair is supplied where a chain of segments leads from its moving point to its centre; of several chains the
 * shortest is taken, of several segments for the same two points the one that stands last in the file.
 *
 * @param bytes    the whole file
 * @param identity id and title for rows and messages, and the accuracy statement
 * @throws ApsidaryError `bad-kernel`
 */
export function openKernel(bytes: Uint8Array, identity: KernelIdentity): Source {
  const spk = readSpk(bytes, identity.title);
  const net = netOf(spk.segments);
  const routes = new Map<string, Route>();
  const routeOf = (pair: Pair): Route => {
    let route = routes.get(pair.name);
    if (!route) {
      route = findRoute(net, pair.target, pair.centre, identity.title);
      routes.set(pair.name, route);
    }
    return route;
  };
  return Object.freeze({
    id: identity.id,
    kind: "kernel",
    title: identity.title,
    spans: (pair: Pair) => routeOf(pair).spans,
    motion(pair: Pair) {
      const { steps, spans } = routeOf(pair);
      if (spans.length === 0) {
        throw new ApsidaryError(
          "not-supplied",
          `${identity.title} has no segments that lead from ${pointLabel(pair.centre)} to ${pointLabel(pair.target)}.`,
        );
      }
      return motionAlong(steps);
    },
    accuracy: identity.accuracy,
    checksum: () => sha256(bytes),
    describe() {
      const { daf, segments } = spk;
      const rows = segments.map(
        (s, i) =>
          `  ${i + 1}: ${pointLabel(s.target)} about ${pointLabel(s.centre)}, type ${s.type}, TDB seconds ${s.from} to ${s.to}, ` +
          `${s.records} records of ${Number((s.recordSeconds / 86400).toFixed(3))} d, ${s.coefficients} coefficients`,
      );
      return [
        `${identity.title}: ${daf.idWord}, ${daf.byteOrder}, ${daf.internalName}`,
        ...rows,
        ...(daf.comments ? ["comments:", daf.comments] : []),
      ].join("\n");
    },
  });
}

/** The links that touch each point. */
type Net = ReadonlyMap<PointId, readonly Link[]>;

function netOf(segments: readonly SpkSegment[]): Net {
  const groups = new Map<string, SpkSegment[]>();
  for (const segment of segments) {
    const key = `${segment.target}/${segment.centre}`;
    const group = groups.get(key);
    if (group) group.push(segment);
    else groups.set(key, [segment]);
  }
  const net = new Map<PointId, Link[]>();
  for (const group of groups.values()) {
    group.reverse();
    const { target, centre } = group[0] as SpkSegment;
    const link = { target, centre, segments: group, spans: unionOf(group) };
    for (const end of [target, centre]) {
      const touching = net.get(end);
      if (touching) touching.push(link);
      else net.set(end, [link]);
    }
  }
  return net;
}

function unionOf(spans: readonly Span[]): Span[] {
  const union: { from: number; to: number }[] = [];
  for (const { from, to } of [...spans].sort((a, b) => a.from - b.from)) {
    const last = union.at(-1);
    if (last && from <= last.to) last.to = Math.max(last.to, to);
    else union.push({ from, to });
  }
  return union;
}

/** Whether every one of some spans lies inside one of others; both in order, none overlapping. */
function liesWithin(inner: readonly Span[], outer: readonly Span[]): boolean {
  let j = 0;
  return inner.every((span) => {
    while (j < outer.length && (outer[j] as Span).to < span.to) j++;
    return j < outer.length && (outer[j] as Span).from <= span.from;
  });
}

/** Chains tried before a kernel is refused; planets and all known moons make a few hundred. */
const MOST_ROUTES = 20_000;

/** Breadth first from the centre: the first chain that reaches the target with a span in common is a shortest one. */
function findRoute(net: Net, target: PointId, centre: PointId, title: string): Route {
  const whole: Span[] = [{ from: -Infinity, to: Infinity }];
  // A point that a chain no longer has reached for the same time is not gone on from again, so rings end and meshes stay tractable.
  const reached = new Map<PointId, (readonly Span[])[]>([[centre, [whole]]]);
  let tried = 0;
  let frontier: { at: PointId; route: Route }[] = [{ at: centre, route: { steps: [], spans: whole } }];
  while (frontier.length > 0) {
    const next: typeof frontier = [];
    for (const { at, route } of frontier) {
      for (const link of net.get(at) ?? []) {
        const step: Step = { link, sign: link.centre === at ? 1 : -1 };
        const to = step.sign === 1 ? link.target : link.centre;
        const spans = commonIntervals(route.spans, link.spans);
        const before = reached.get(to) ?? [];
        if (spans.length === 0 || before.some((earlier) => liesWithin(spans, earlier))) continue;
        const longer = { steps: [...route.steps, step], spans };
        if (to === target) return longer;
        reached.set(to, [...before, spans]);
        if (++tried > MOST_ROUTES) {
          throw new ApsidaryError(
            "bad-kernel",
            `${title} chains its segments in more than ${MOST_ROUTES} ways; take some out.`,
          );
        }
        next.push({ at: to, route: longer });
      }
    }
    frontier = next;
  }
  return { steps: [], spans: [] };
}

function segmentAt(link: Link, tdb: number): SpkSegment {
  const { segments } = link;
  for (const segment of segments) if (tdb >= segment.from && tdb <= segment.to) return segment;
  return segments[0] as SpkSegment;
}

function motionAlong(steps: readonly Step[]): Motion {
  const fill = (tdb: number, out: Float64Array, order: number): void => {
    for (let i = 3 * order + 2; i >= 0; i--) out[i] = 0;
    for (let i = 0; i < steps.length; i++) {
      const { link, sign } = steps[i] as Step;
      addSegmentState(segmentAt(link, tdb), tdb, sign, order, out);
    }
  };
  return {
    givesVelocity: true,
    state: (tdb, out) => fill(tdb, out, 1),
    stateAndAcceleration: (tdb, out) => fill(tdb, out, 2),
  };
}
