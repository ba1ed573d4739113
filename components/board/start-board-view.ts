import { evaluateCamp } from "@/lib/calc/camp";
import { buildShelter } from "@/lib/calc/shelter-kinds";
import { GROUNDS } from "@/lib/calc/tables/grounds";
import type { CampResult, ShelterModel, Vec3 } from "@/lib/calc/types";
import { toCampInput } from "@/lib/domain/plan/to-camp-input";
import type { CampPlanView } from "@/lib/domain/views";

/** What the board shows before the calculation has been loaded in the browser: worked out on the server. */
export interface BoardStart {
  readonly result: CampResult;
  /** By pitch id; only what the drawing needs. Null where the shelter can't be built. */
  readonly models: Readonly<Record<string, ShelterModel | null>>;
  readonly groundName: string | null;
}

export function startBoardView(view: CampPlanView): BoardStart {
  const { details } = view.camp;
  const result = evaluateCamp(toCampInput(details, view.pitches, view.tray, view.placements, view.learned));
  return {
    result: withoutWorkings(result),
    models: Object.fromEntries(view.pitches.map((pitch) => [pitch.id, toDrawnModel(pitch.spec)])),
    groundName: GROUNDS.find((one) => one.kind === details.ground?.kind)?.name ?? null,
  };
}

/** The workings have a page of their own and would be most of what is sent. */
function withoutWorkings(result: CampResult): CampResult {
  return {
    ...result,
    wind: result.wind && { ...result.wind, workings: [] },
    shelters: result.shelters.map((shelter) => ({
      ...shelter,
      tieOuts: shelter.tieOuts.map((one) => ({
        ...one,
        capacity: one.capacity?.status === "ok" ? { ...one.capacity, workings: [] } : one.capacity,
      })),
    })),
  };
}

function toDrawnModel(spec: Parameters<typeof buildShelter>[0]): ShelterModel | null {
  try {
    const model = buildShelter(spec);
    const toMillimetres = ({ x, y, z }: Vec3): Vec3 => ({ x: round(x), y: round(y), z: round(z) });
    const nodes = model.nodes.map((node) => ({ ...node, position: toMillimetres(node.position) }));
    return { ...model, nodes, links: [], poles: [], hoops: [] };
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}

const round = (metres: number) => Math.round(metres * 1000) / 1000;
