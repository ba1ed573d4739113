"use client";

import { useEffect, useState } from "react";
import type * as EngineModule from "./engine";

export type Engine = typeof EngineModule;

export function loadEngine(): Promise<Engine> {
  return import("./engine");
}

/** Null until the calculation has been loaded; until then the page shows what the server worked out. */
export function useEngine(): Engine | null {
  const [engine, setEngine] = useState<Engine | null>(null);
  useEffect(() => {
    let isHere = true;
    void loadEngine().then((loaded) => {
      if (isHere) setEngine(() => loaded);
    });
    return () => {
      isHere = false;
    };
  }, []);
  return engine;
}
