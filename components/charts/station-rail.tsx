'use client';

import { useId, type PointerEvent } from 'react';
import { axisFor, frequencyAt, type Station } from '@/templates/drawings/reach-axis';
import { stationWords } from '@/templates/drawings/reach-sentence';
import { ReachRail, type ReachRailProps } from './reach-rail';

export type StationRailProps = Omit<ReachRailProps, 'chosen' | 'stations'> & {
  stations: readonly Station[];
  /** Frequency of the chosen station, hertz. */
  chosen: number | undefined;
  onChoose: (f: number) => void;
};

/** The rail with its stations to be walked: pointing chooses the nearest, arrow keys go from one to the next. */
export function StationRail({ stations, chosen, onChoose, className = '', ...rail }: StationRailProps) {
  const id = useId();
  const ordered = [...stations].sort((a, b) => a.f - b.f);
  const index = Math.max(
    0,
    ordered.findIndex((station) => station.f === chosen),
  );
  const here = ordered[index];
  if (!here) return <ReachRail {...rail} stations={stations} className={className} />;

  function point(event: PointerEvent<HTMLDivElement>) {
    const { left, width } = event.currentTarget.getBoundingClientRect();
    const f = frequencyAt(axisFor(rail.band), (event.clientX - left) / width);
    const nearest = ordered.reduce((best, station) =>
      Math.abs(Math.log(station.f / f)) < Math.abs(Math.log(best.f / f)) ? station : best,
    );
    if (nearest.f !== chosen) onChoose(nearest.f);
  }

  return (
    <div className={`relative ${className}`} onPointerMove={point}>
      <ReachRail {...rail} stations={stations} chosen={chosen} />
      <label htmlFor={id} className="sr-only">
        Station on the rail
      </label>
      <input
        id={id}
        type="range"
        min={0}
        max={ordered.length - 1}
        step={1}
        value={index}
        aria-valuetext={stationWords({ band: rail.band, nominal: rail.nominal, worst: rail.worst }, here)}
        onChange={(event) => {
          const next = ordered[Number(event.target.value)];
          if (next) onChoose(next.f);
        }}
        className="absolute inset-0 m-0 h-full w-full cursor-pointer appearance-none bg-transparent [&::-moz-range-thumb]:opacity-0 [&::-webkit-slider-thumb]:appearance-none"
      />
    </div>
  );
}
