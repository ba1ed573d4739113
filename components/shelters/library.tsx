import Link from "next/link";
import { defaultShelterSpec, SHELTER_KINDS } from "@/lib/calc/shelter-kinds";
import type { ShelterDetails } from "@/lib/domain/shelter/schema";
import { ShelterCard, ShelterGrid } from "./shelter-card";

/** A shelter of the built-in library, as it stands there. */
export function libraryShelter(kindId: string): ShelterDetails | null {
  const kind = SHELTER_KINDS.find((one) => one.kind === kindId);
  if (!kind) return null;
  const { name, typicalSleeps: sleeps, typicalMassKg: massKg } = kind;
  return { name, sleeps, massKg, spec: defaultShelterSpec(kind.kind) };
}

/** The ten generic kinds; each leads to its own numbers. */
export function ShelterLibrary({ hrefOf }: { readonly hrefOf: (kind: string) => string }) {
  return (
    <ShelterGrid>
      {SHELTER_KINDS.map((kind) => {
        const details = libraryShelter(kind.kind);
        return (
          details && (
            <li key={kind.kind}>
              <ShelterCard
                details={details}
                note={kind.description}
                title={
                  <Link
                    href={hrefOf(kind.kind)}
                    className="inline-flex min-h-11 items-center text-spruce hover:underline"
                  >
                    {kind.name}
                  </Link>
                }
              />
            </li>
          )
        );
      })}
    </ShelterGrid>
  );
}
