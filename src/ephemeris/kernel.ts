import type { Pair } from "../bodies/pair.ts";
import { type PointId, pointLabel } from "../bodies/point.ts";
import { ApsidaryError } from "../error.ts";
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
  const links = linksOf(spk.segments);
  const routes = new Map<string, Route>();
  const routeOf = (pair: Pair): Route => {
    let route = routes.get(pair.name);
    if (!route) {
      route = findRoute(links, pair.target, pair.centre);
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
          `${s.records} records of ${s.recordSeconds / 86400} d, ${s.coefficients} coefficients`,
      );
      return [
        `${identity.title}: ${daf.idWord}, ${daf.byteOrder}, ${daf.internalName}`,
        ...rows,
        ...(daf.comments ? ["comments:", daf.comments] : []),
      ].join("\n");
    },
  });
}

function linksOf(segments: readonly SpkSegment[]): Link[] {
  const groups = new Map<string, SpkSegment[]>();
  for (const segment of segments) {
    const key = `${segment.target}/${segment.centre}`;
    groups.set(key, [segment, ...(groups.get(key) ?? [])]);
  }
  return [...groups.values()].map((group) => {
    const { target, centre } = group[0] as SpkSegment;
    return { target, centre, segments: group, spans: unionOf(group) };
  });
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

function intersectionOf(a: readonly Span[], b: readonly Span[]): Span[] {
  const common: Span[] = [];
  for (const x of a) {
    for (const y of b) {
      const from = Math.max(x.from, y.from);
      const to = Math.min(x.to, y.to);
      if (from < to) common.push({ from, to });
    }
  }
  return common;
}

/** Breadth first from the centre: the first chain that reaches the target with a span in common is a shortest one. */
function findRoute(links: readonly Link[], target: PointId, centre: PointId): Route {
  const whole: Span[] = [{ from: -Infinity, to: Infinity }];
  let frontier: { at: PointId; visited: readonly PointId[]; route: Route }[] = [
    { at: centre, visited: [centre], route: { steps: [], spans: whole } },
  ];
  while (frontier.length > 0) {
    const next: typeof frontier = [];
    for (const { at, visited, route } of frontier) {
      for (const link of links) {
        const sign = link.centre === at ? 1 : link.target === at ? -1 : 0;
        if (sign === 0) continue;
        const to = sign === 1 ? link.target : link.centre;
        if (visited.includes(to)) continue;
        const spans = intersectionOf(route.spans, link.spans);
        if (spans.length === 0) continue;
        const longer = { steps: [...route.steps, { link, sign } as Step], spans };
        if (to === target) return longer;
        next.push({ at: to, visited: [...visited, to], route: longer });
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

async function sha256(bytes: Uint8Array): Promise<string> {
  const digest = await globalThis.crypto.subtle.digest("SHA-256", bytes as Uint8Array<ArrayBuffer>);
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, "0")).join("");
}
