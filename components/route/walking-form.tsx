"use client";

import { useState } from "react";
import { ActionForm, type FormAction } from "@/components/ui/action-form";
import { CheckField, NumberField, SelectField, TextField } from "@/components/ui/fields";
import { Section } from "@/components/ui/layout";
import { ConflictChoice } from "@/components/forms/conflict-choice";
import { clockNow, SaveBar, type SaveState } from "@/components/forms/save-bar";
import { BLANK_LEG, type RouteSettings } from "@/lib/domain/route/schema";
import type { RouteView } from "@/lib/domain/route/views";
import type { Preferences } from "@/lib/domain/preferences";
import { formatClock, LONG_UNITS } from "@/lib/format/distances";
import { METRES } from "@/lib/format/factors";
import { TypedLegs } from "./typed-legs";

const RULE_OPTIONS = [
  { value: "slowest", label: "The slowest of the rules" },
  { value: "naismith", label: "Naismith: 5 km/h, 1 h for 600 m up" },
  { value: "langmuir", label: "Langmuir: Naismith with descents" },
  { value: "tobler", label: "Tobler: speed by slope" },
  { value: "din", label: "DIN 33466: 4 km/h, 300 m/h up, 500 m/h down" },
];
const FITNESS_OPTIONS = [15, 20, 25, 30, 40, 50].map((minutes) => ({
  value: String(minutes),
  label: `${minutes} min for 300 m up in 800 m`,
}));
const LINES_OPTIONS = [
  { value: "0", label: "None" },
  { value: "1", label: "One line down: heavy packs" },
  { value: "2", label: "Two lines: and soft ground or head wind" },
  { value: "3", label: "Three lines: and snow or dark" },
];
const TERRAIN_OPTIONS = [
  { value: "path", label: "Path or track" },
  { value: "rough", label: "Brush, rough ground" },
  { value: "soft", label: "Bog, soft sand" },
];
const HEAT_OPTIONS = [
  { value: "cool", label: "Cool: WBGT under 25.6 °C" },
  { value: "warm", label: "WBGT 25.6 to 27.7 °C" },
  { value: "hot", label: "WBGT 27.8 to 29.3 °C" },
  { value: "very-hot", label: "WBGT 29.4 to 31.0 °C" },
  { value: "severe", label: "WBGT 31.1 to 32.1 °C" },
  { value: "extreme", label: "WBGT over 32.2 °C" },
];

const shown = (value: number | null, factor = 1) => (value === null ? "" : String(Number((value / factor).toFixed(2))));
const clock = (minute: number | null) => (minute === null ? "" : formatClock(minute).padStart(5, "0"));

/** How the group walks, and each day's own time of setting off, or its length where the line does not say it. */
export function WalkingForm({
  view,
  preferences,
  action,
}: {
  readonly view: RouteView;
  readonly preferences: Preferences;
  readonly action: FormAction<null>;
}) {
  const [state, setState] = useState<SaveState>({ kind: "clean" });
  const { settings } = view;
  return (
    <ActionForm
      action={action}
      doneText={null}
      onDone={() => setState({ kind: "saved", at: clockNow() })}
      onChange={() => setState((now) => (now.kind === "dirty" ? now : { kind: "dirty" }))}
    >
      <input type="hidden" name="tripId" value={view.tripId} />
      <input type="hidden" name="version:number" value={view.settingsVersion} />
      <input type="hidden" name="lengthUnit" value={preferences.lengthUnit} />
      <ConflictChoice href={`/trips/${view.tripId}/route`} />
      <Section
        title="How the group walks"
        lead="What is left empty is left out, and the page says what is missing for it."
      >
        <TimeFields settings={settings} />
        <PaceFields settings={settings} />
        <BodyFields settings={settings} />
      </Section>
      <TypedLegs
        view={view}
        unit={preferences.lengthUnit}
        shortM={METRES[preferences.lengthUnit]}
        longM={LONG_UNITS[preferences.lengthUnit].metres}
        blank={BLANK_LEG}
        shown={shown}
        clock={clock}
      />
      <SaveBar state={state} label="Save how we walk" />
    </ActionForm>
  );
}

function TimeFields({ settings }: { readonly settings: RouteSettings }) {
  return (
    <div className="mb-5 grid items-start gap-4 sm:grid-cols-2 lg:grid-cols-4">
      <TextField
        type="time"
        name="settings.setOffMinute"
        label="Set off"
        defaultValue={clock(settings.setOffMinute)}
        hint="On the trip&rsquo;s clock."
      />
      <NumberField
        name="settings.breakMinPerHour"
        label="Breaks in each hour"
        unit="min"
        defaultValue={shown(settings.breakMinPerHour)}
      />
      <NumberField
        name="settings.pitchingMin"
        label="Pitching takes"
        unit="min"
        defaultValue={shown(settings.pitchingMin)}
      />
      <SelectField name="settings.rule" label="Time by" options={RULE_OPTIONS} defaultValue={settings.rule} />
    </div>
  );
}

function PaceFields({ settings }: { readonly settings: RouteSettings }) {
  return (
    <div className="mb-5 grid items-start gap-4 sm:grid-cols-2 lg:grid-cols-4">
      <NumberField
        name="settings.paceRatio"
        label="Group&rsquo;s pace"
        unit="%"
        defaultValue={shown(settings.paceRatio, 0.01)}
        hint="100 is the rule&rsquo;s own speed. Empty: the same."
      />
      <SelectField
        name="settings.fitness:number"
        label="Fitness of the slowest"
        placeholder="Tranter not used"
        options={FITNESS_OPTIONS}
        defaultValue={shown(settings.fitness)}
      />
      <SelectField
        name="settings.linesLower:number"
        label="Allowance for packs"
        options={LINES_OPTIONS}
        defaultValue={String(settings.linesLower)}
        hint="Lines down Tranter&rsquo;s table. Common practice."
      />
      <CheckField
        name="settings.isOffPath"
        label="Mostly off the path"
        defaultChecked={settings.isOffPath}
        hint="Tobler then takes six tenths of the speed."
      />
    </div>
  );
}

function BodyFields({ settings }: { readonly settings: RouteSettings }) {
  return (
    <details className="mb-2">
      <summary className="min-h-11 cursor-pointer py-2 text-15 font-semibold text-spruce">For energy and water</summary>
      <div className="mt-2 grid items-start gap-4 sm:grid-cols-2 lg:grid-cols-4">
        <NumberField name="settings.bodyKg" label="Body mass" unit="kg" defaultValue={shown(settings.bodyKg)} />
        <NumberField name="settings.packKg" label="Pack" unit="kg" defaultValue={shown(settings.packKg)} />
        <SelectField
          name="settings.terrain:nullable"
          label="Ground of the way"
          placeholder="Not said"
          options={TERRAIN_OPTIONS}
          defaultValue={settings.terrain ?? ""}
        />
        <SelectField
          name="settings.heat:nullable"
          label="Heat of the days"
          placeholder="Not said"
          options={HEAT_OPTIONS}
          defaultValue={settings.heat ?? ""}
        />
      </div>
      <p className="mt-2 max-w-[46rem] text-13 text-pencil">
        Energy by Pandolf (1977) and Santee (2001) over the profile, between the kinder and the harder ground of Soule
        and Goldman (1972). Water by TB MED 507; people differ by a quarter of a litre an hour, and need more than they
        drink while walking.
      </p>
    </details>
  );
}
