"use client";

import { useMutation } from "@tanstack/react-query";
import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import type { ShelterAnalysis, ShelterSpec } from "@/lib/calc/types";
import { toWindInput } from "@/lib/domain/plan/to-camp-input";
import type { PitchDetails } from "@/lib/domain/shelter/schema";
import type { CampPlanView, PitchView } from "@/lib/domain/views";
import { patchPitch, RefusedError } from "./board-requests";
import type { CalcClient } from "./calc-client";
import type { Engine } from "./use-engine";

interface Changed {
  readonly details: PitchDetails;
  readonly version: number;
  readonly isSaved: boolean;
}

/** The spec of a shelter as it stands with other pitch details. */
function specWith(pitch: PitchView, details: PitchDetails): ShelterSpec {
  return {
    ...pitch.spec,
    dimensions: { ...pitch.spec.dimensions, ...details.dimensions },
    lineLengthsM: { ...pitch.spec.lineLengthsM, ...details.lineLengthsM },
  };
}

/** The pitched shelters with what was changed here laid over; a changed one is worked out anew beside the page. */
export function useCampPitches(
  view: CampPlanView,
  calc: CalcClient,
  engine: Engine | null,
  { onRefused, onSaved }: { readonly onRefused: (reason: string) => void; readonly onSaved: () => void },
) {
  const [changed, setChanged] = useState<Readonly<Record<string, Changed>>>({});
  const [analyses, setAnalyses] = useState<ReadonlyMap<string, ShelterAnalysis>>(() => new Map());
  const asked = useRef(new Set<string>());
  const versions = useRef(new Map<string, number>());
  const wind = useMemo(() => toWindInput(view.camp.details), [view.camp.details]);
  const scope = { tripId: view.trip.id, campId: view.camp.id };

  const worked = useMemo(
    () =>
      view.pitches.map((pitch) => {
        const over = changed[pitch.id];
        const isOld = over && (over.isSaved ? pitch.version >= over.version : pitch.version > over.version);
        if (!over || isOld) return { pitch, key: null, request: null };
        const spec = specWith(pitch, over.details);
        const next: PitchView = { ...pitch, details: over.details, version: over.version, spec, analysis: null };
        if (!engine) return { pitch: next, key: null, request: null };
        const { headingDeg, patch } = over.details;
        const request = engine.designAnalysisRequest(
          { wind },
          { pitchId: pitch.id, name: pitch.name, spec, headingDeg, patch, analysis: null },
        );
        if ("gaps" in request) return { pitch: next, key: null, request: null };
        const key = engine.analysisKey(request.spec, request.relativeWindDirectionsDeg, request.pressurePa);
        return { pitch: { ...next, analysis: analyses.get(key) ?? null }, key, request };
      }),
    [view.pitches, changed, analyses, wind, engine],
  );

  useEffect(() => {
    for (const { key, request, pitch } of worked) {
      if (!key || !request || pitch.analysis || asked.current.has(key)) continue;
      asked.current.add(key);
      calc
        .run("analyse", request)
        .then((analysis) => setAnalyses((before) => new Map(before).set(key, analysis)))
        .catch(() => {
          asked.current.delete(key);
          onRefused(`The pull in the lines of ${pitch.name} could not be worked out.`);
        });
    }
  }, [worked, calc, onRefused]);

  const { mutate } = useMutation({
    // One after the other, each on the version that the one before it made.
    mutationFn: ({ pitchId, version, details }: { pitchId: string; version: number; details: PitchDetails }) =>
      patchPitch(scope, pitchId, { version: Math.max(version, versions.current.get(pitchId) ?? 0), details }),
    networkMode: "always",
    scope: { id: `pitches-${view.camp.id}` },
    onSuccess: ({ version }, { pitchId, details }) => {
      versions.current.set(pitchId, version);
      setChanged((before) => {
        const over = before[pitchId];
        if (!over) return before;
        return { ...before, [pitchId]: { ...over, version, isSaved: over.details === details } };
      });
      onSaved();
    },
    onError: (error, { pitchId }) => {
      setChanged((before) => Object.fromEntries(Object.entries(before).filter(([id]) => id !== pitchId)));
      const why = error instanceof RefusedError ? error.message : "There is no connection.";
      onRefused(`The shelter was not changed: ${why}`);
    },
  });

  const pitches = useMemo(() => worked.map((one) => one.pitch), [worked]);
  const waiting = useMemo(
    () => new Set(worked.flatMap(({ key, pitch }) => (key && !pitch.analysis ? [pitch.id] : []))),
    [worked],
  );
  const changePitch = useCallback(
    (pitchId: string, details: PitchDetails) => {
      const pitch = pitches.find((one) => one.id === pitchId);
      if (!pitch) return;
      setChanged((before) => ({ ...before, [pitchId]: { details, version: pitch.version, isSaved: false } }));
      mutate({ pitchId, version: pitch.version, details });
    },
    [pitches, mutate],
  );
  return { pitches, waiting, changePitch };
}
