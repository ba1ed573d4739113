import type { CapacityInput, Evaluated } from "./capacity";
import { groundStrength } from "./ground";
import { knotEfficiency, knotRow, lineBreakingLoadN, lineRow, lineStrengthN } from "./line";
import { materialRow } from "./materials";
import type { DrivenDetail } from "./stake-limits";
import type { MaterialId, Working } from "./types";

const BRINCH_HANSEN = "Brinch Hansen (1961), DGI Bulletin 12, from memory";

function line(symbol: string, meaning: string, value: number | string, unit: string, source: string): Working {
  return { symbol, meaning, value, unit, source };
}

/** The working of a capacity, step by step, from the numbers that were found on the way. */
export function capacityWorkings(input: CapacityInput, result: Evaluated): readonly Working[] {
  const { rigging } = input;
  const workings: Working[] = [
    ...groundStrength(input.ground).workings,
    line("θ", "line above the ground, under load", input.lineAngleDeg, "°", "input"),
  ];
  if (result.loosening < 1) {
    workings.push(
      line(
        "N",
        "pulls near the design gust",
        input.pullCycles ?? 0,
        "",
        "hours of strong wind × 12 an hour, judgement",
      ),
      line(
        "N^−t",
        rigging.shockCord ? "share of ground strength left, with shock cord" : "share of ground strength left",
        result.loosening,
        "",
        "Long & Vanneste (1994), from memory",
      ),
    );
  }
  switch (result.detail.kind) {
    case "stake":
      workings.push(line("β", "lean from upright, away from the pull", rigging.leanDeg, "°", "input"));
      if (input.anchor.class === "stake") workings.push(...drivenWorkings(result.detail.driven, input.anchor.material));
      break;
    case "screw-in":
      if (input.anchor.class === "screw-in") {
        workings.push(...drivenWorkings(result.detail.driven, input.anchor.material));
      }
      workings.push(
        line(
          "Q_u",
          "upward resistance of the helix",
          result.detail.upliftN,
          "N",
          "N_c = 9 in clay; Meyerhof & Adams (1968) in sand; × 0.7 disturbance, judgement",
        ),
      );
      break;
    case "deadman":
      workings.push(
        line("ψ", "slope factor", result.detail.slopeFactor, "", "sliding wedge, Coulomb"),
        line(
          "H",
          "resistance to a level pull",
          result.detail.deadman.horizontalN,
          "N",
          "Teng (1962) with Ovesen & Stromann (1972), or Das plate factor in clay; from memory",
        ),
        line(
          "V",
          "resistance to a pull straight up",
          result.detail.deadman.upliftN,
          "N",
          "Meyerhof & Adams (1968), or half the plate factor through backfill in clay; from memory",
        ),
        line(
          "T",
          "at the line's angle",
          result.detail.deadman.tensionN,
          "N",
          "Meyerhof (1973), quadratic, from memory",
        ),
      );
      break;
    case "surface-weight":
      workings.push(
        line("μ", "friction under the weight", result.detail.frictionCoefficient, "", "NAVFAC DM-7.02 Table 1 (1986)"),
        line("T", "μW/(cosθ + μ sinθ), slope counted", result.limits[0]?.medianN ?? 0, "N", "statics of a block"),
      );
      break;
    case "snow-plate":
      workings.push(
        line("σ_c", "bearing strength that counts", result.detail.bearingPa, "Pa", "F = σ_c·A, ISSW (2010)"),
        line("T", "σ_c × face × cosθ", result.limits[0]?.medianN ?? 0, "N", "line angle: judgement"),
      );
      break;
    case "natural":
      workings.push(line("", "anchor itself", "checked: the line and its knot decide", "", "judgement"));
      break;
    case "fixed":
      workings.push(line("R", "rating of the fixing", result.detail.ratingN, "N", "input"));
      break;
  }
  workings.push(...closingWorkings(input, result));
  return workings;
}

function drivenWorkings(driven: DrivenDetail, material: MaterialId): Working[] {
  const materialName = materialRow(material).name;
  const workings: Working[] = [
    line("L", "length in ground that holds", driven.resistingM, "m", "geometry"),
    line("e", "from there up to the line, along the stake", driven.eccentricityM, "m", "geometry"),
    line("d", "width that presses on the ground", driven.properties.widthM, "m", "section geometry"),
    line("ψ_c", "lean and slope factor on cohesion", driven.leanFactors.cohesion, "", "sliding wedge, Coulomb"),
    line("ψ_γ", "lean and slope factor on weight", driven.leanFactors.weight, "", "sliding wedge, Coulomb"),
    line("z_r", "depth of the turning point", driven.pile.rotationDepthM, "m", BRINCH_HANSEN),
    line("H", "pull across the stake at which the ground gives", driven.pile.groundN, "N", BRINCH_HANSEN),
    line("M_max", "largest moment in the stake at that pull", driven.pile.largestMomentNm, "N·m", BRINCH_HANSEN),
    line("M_y", "moment at first yield, f_y·S", driven.firstYieldNm, "N·m", `section geometry; ${materialName}`),
    line("M_u", "bending strength", driven.ultimateNm, "N·m", `section geometry; ${materialName}`),
  ];
  if (driven.bendingNormalN !== null) {
    workings.push(
      line("H_b", "pull across the stake at which it bends", driven.bendingNormalN, "N", "Broms (1964), plastic hinge"),
    );
  }
  workings.push(
    line("τ", "shear along the shaft", driven.shaft.shearPa, "Pa", "α-method API RP 2A; K·σ'·tanδ NAVFAC DM-7.2"),
    line("V", "pull along the stake at which it comes out", driven.shaft.axialN, "N", "friction × outline × length"),
  );
  if (driven.rockAxialN > 0) {
    workings.push(
      line("ΔH", "rock on the lip, across", driven.rockNormalN, "N", "½W·tan(π/4 + φ/2), judgement"),
      line("ΔV", "rock on the lip, along", driven.rockAxialN, "N", "½W, judgement"),
    );
  }
  workings.push(
    line(
      "T_g",
      "tension at which the ground gives",
      driven.groundTensionN,
      "N",
      "Meyerhof (1973); Meyerhof & Yalcin (1984), from memory",
    ),
  );
  if (driven.bendingTensionN !== null) {
    workings.push(line("T_b", "tension at which the stake bends", driven.bendingTensionN, "N", "as T_g with H_b"));
  }
  return workings;
}

function closingWorkings(input: CapacityInput, result: Evaluated): Working[] {
  const { line: cord, knot } = input.rigging;
  const workings: Working[] = [];
  if (input.anchor.class === "stake" && input.anchor.headRatingN !== null) {
    workings.push(line("R", "rating of the head", input.anchor.headRatingN, "N", "input"));
  }
  if (result.tandem !== null) {
    workings.push(
      line("T_2", "what the second anchor holds by itself", result.tandem.rearN, "N", "as the first"),
      line(
        "k",
        "share of it that counts at this distance",
        result.tandem.share,
        "",
        "picket holdfasts 1-1 = 2.0 × single (FM 5-125 Table 4-1, from memory); nearer: judgement",
      ),
    );
  }
  workings.push(
    line(
      "F",
      `breaking load of the line, ${lineRow(cord.material).name} ${cord.diameterMm} mm`,
      lineBreakingLoadN(cord.material, cord.diameterMm),
      "N",
      "EN 564 / UIAA 102 form, from memory",
    ),
    line("η", `left at the knot: ${knotRow(knot).name}`, knotEfficiency(knot, cord.material), "", knotRow(knot).source),
    line("F·η", "what the wet line holds", lineStrengthN(cord.material, cord.diameterMm, knot), "N", "F × wet × η"),
    line("R_50", `median: ${result.mode.replace("-", " ")} first`, result.medianN, "N", "smallest of the above"),
    line("σ", "scatter (σ of the logarithm)", result.scatter, "", "ground, material or line"),
    line("R_05", "dependable value, 5 % fractile", result.dependableN, "N", "R_50·e^(−1.645σ), EN 1990 Annex D.7"),
  );
  return workings;
}
