"use client";

import { useState, type MouseEvent } from "react";
import { Button } from "@/components/ui/button";
import type { LatLon } from "@/lib/calc/places/utm";
import { parsePosition } from "@/lib/calc/places/parse-position";
import type { ActionState } from "@/lib/domain/action-state";
import type { RouteView } from "@/lib/domain/route/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatDistance } from "@/lib/format/distances";
import { PlanFurniture } from "./plan-furniture";
import { projectAll, projectAround, type PlanProjection } from "./plan-projection";
import { listSketchCamps, SKETCH_HEIGHT, SketchCamps, type SketchCamp } from "./plan-sketch";
import { useWidth } from "./use-width";

const MAX_POINTS = 500;
const DIGITS = 6;

interface DrawRouteProps {
  readonly view: RouteView;
  readonly unit: Preferences["lengthUnit"];
  readonly action: (state: ActionState, drawing: object) => Promise<ActionState>;
  readonly onDone: () => void;
}

const round = (place: LatLon): LatLon => ({
  latitude: Number(place.latitude.toFixed(DIGITS)),
  longitude: Number(place.longitude.toFixed(DIGITS)),
});

/** On the plane of the sketch: for the eye while drawing, the saved length is measured on the ellipsoid. */
function roughLengthM(points: readonly LatLon[], projection: PlanProjection): number {
  const drawn = points.map(projection.toXy);
  return drawn.slice(1).reduce((sum, point, index) => {
    const before = drawn[index] ?? point;
    return sum + Math.hypot(point.x - before.x, point.y - before.y) * projection.metresPerPixel;
  }, 0);
}

/** A way drawn by hand: points set by clicking, by choosing a camp or by typing where they are. */
export function DrawRoute({ view, unit, action, onDone }: DrawRouteProps) {
  const { ref, width } = useWidth(760);
  const camps = listSketchCamps(view);
  const [points, setPoints] = useState<readonly LatLon[]>([]);
  const [zoom, setZoom] = useState(1);
  const [message, setMessage] = useState("");
  const size = { width, height: SKETCH_HEIGHT };
  const whole = projectAll(camps.length > 0 ? camps : points.slice(0, 1), size, 90);
  const projection =
    whole &&
    (zoom === 1
      ? whole
      : projectAround(whole.toPlace(width / 2, SKETCH_HEIGHT / 2), whole.metresPerPixel / zoom, size));

  const add = (place: LatLon) => {
    if (points.length >= MAX_POINTS) return setMessage(`At most ${MAX_POINTS} points.`);
    setPoints((now) => [...now, round(place)]);
    setMessage(`Point ${points.length + 1} is set.`);
  };
  const addAt = (event: MouseEvent<SVGSVGElement>) => {
    if (!projection) return;
    const box = event.currentTarget.getBoundingClientRect();
    add(projection.toPlace(event.clientX - box.left, event.clientY - box.top));
  };
  const save = async () => {
    setMessage("Saving…");
    const answer = await action({ status: "idle" }, { tripId: view.tripId, points });
    if (answer.status === "refused") return setMessage(answer.formError);
    onDone();
  };

  return (
    <div>
      <p className="mb-3 max-w-[46rem] text-15 text-pencil">
        Click points along the way, from the start on; or add camps and typed positions. A drawn way has no heights.
      </p>
      {projection ? (
        <div ref={ref} className="w-full border border-hair bg-sheet">
          <svg
            width={width}
            height={SKETCH_HEIGHT}
            role="img"
            aria-label={`Sketch with ${points.length} points`}
            className="block max-w-full cursor-crosshair"
            onClick={addAt}
          >
            <DrawnLine points={points} projection={projection} />
            <SketchCamps camps={camps} projection={projection} width={width} />
            <PlanFurniture metresPerPixel={projection.metresPerPixel} unit={unit} size={size} />
          </svg>
        </div>
      ) : (
        <p className="border-l-4 border-hair py-2 pl-5 text-15 text-pencil">
          No camp has a position yet. Type where the way starts; the sketch opens around it.
        </p>
      )}
      <div className="mt-3 flex flex-wrap gap-3">
        <Button look="primary" disabled={points.length < 2} onClick={() => void save()}>
          Save this way
        </Button>
        <Button disabled={points.length === 0} onClick={() => setPoints((now) => now.slice(0, -1))}>
          Take the last point back
        </Button>
        {projection && (
          <>
            <Button onClick={() => setZoom((now) => Math.min(16, now * 2))}>Closer</Button>
            <Button onClick={() => setZoom((now) => Math.max(0.125, now / 2))}>Wider</Button>
          </>
        )}
        <Button look="quiet" onClick={onDone}>
          Stop drawing
        </Button>
      </div>
      <AddPlaces camps={camps} onAdd={add} onProblem={setMessage} />
      <p role="status" className="mt-2 min-h-6 text-15 text-pencil">
        {projection && points.length > 1 && `About ${formatDistance(roughLengthM(points, projection), unit)}. `}
        {message}
      </p>
    </div>
  );
}

function DrawnLine({
  points,
  projection,
}: {
  readonly points: readonly LatLon[];
  readonly projection: PlanProjection;
}) {
  const drawn = points.map(projection.toXy);
  return (
    <>
      {drawn.length > 1 && (
        <path
          d={`M${drawn.map(({ x, y }) => `${x.toFixed(1)} ${y.toFixed(1)}`).join("L")}`}
          className="stroke-spruce"
          strokeWidth={2.2}
          fill="none"
        />
      )}
      {drawn.map(({ x, y }, index) => (
        <circle key={index} cx={x} cy={y} r={4} className="fill-spruce" />
      ))}
    </>
  );
}

function AddPlaces({
  camps,
  onAdd,
  onProblem,
}: {
  readonly camps: readonly SketchCamp[];
  readonly onAdd: (place: LatLon) => void;
  readonly onProblem: (problem: string) => void;
}) {
  const [typed, setTyped] = useState("");
  const addTyped = () => {
    const parsed = parsePosition(typed);
    if ("problem" in parsed) return onProblem(parsed.problem);
    onAdd(parsed.place);
    setTyped("");
  };
  return (
    <div className="mt-4 grid gap-4 md:grid-cols-2">
      <div>
        <label htmlFor="typed-point" className="text-15 font-semibold">
          Point by position
        </label>
        <div className="mt-1 flex gap-2">
          <input
            id="typed-point"
            value={typed}
            onChange={(event) => setTyped(event.target.value)}
            onKeyDown={(event) => event.key === "Enter" && addTyped()}
            placeholder="61.93, 8.72 or 32V NM 12345 67890"
            className="min-h-11 w-full min-w-0 rounded-field border border-pencil bg-sheet px-3 py-2 text-15 text-ink placeholder:text-pencil"
          />
          <Button onClick={addTyped}>Add</Button>
        </div>
      </div>
      {camps.length > 0 && (
        <div>
          <p className="text-15 font-semibold">Point at a camp</p>
          <div className="mt-1 flex flex-wrap gap-2">
            {camps.map((camp) => (
              <Button key={camp.id} onClick={() => onAdd(camp)}>
                {camp.name}
              </Button>
            ))}
          </div>
        </div>
      )}
    </div>
  );
}
