import loadHighs from "highs";
import { toProgramSolver } from "@/lib/workers/kit-solver";

const highs = await loadHighs();

export const SOLVE = toProgramSolver(highs, 20);
export { highs };
