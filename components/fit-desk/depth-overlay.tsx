'use client';

import { useRef, type PointerEvent } from 'react';

import type { Ridge } from '@/components/charts/chart-types';
import { depthLayout } from '@/components/charts/depth-layout';
import { ridgeBases } from '@/components/charts/ridgeline-panel';
import { withDecimals } from '@/lib/format';

import { DragHandle } from './drag-handle';
import { movedByKey, type Drawable } from './drawn-values';
import { useFrame } from './use-frame';

export interface DepthOverlayProps {
  width: number;
  height: number;
  capThicknessNm: number;
  maxDepthNm: number;
  ridges: readonly Ridge[];
  /** Where the handle stands: drawn, held or fitted; null while nothing is known, and on a saved fit. */
  edge: null | { valueNm: number; isDrawn: boolean; stepNm: number; limitNm: number };
  readDepthNm: number | null;
  onMove: (name: Drawable, value: number) => void;
  onDrop: (name: Drawable) => void;
  onClear: () => void;
  onReadDepth: (depthNm: number | null) => void;
  onReadEnergy: (energyKeV: number | null) => void;
}

/** What can be touched in the depth figure: the edge to drag, and depth and energy to point at. */
export function DepthOverlay(props: DepthOverlayProps) {
  const {
    width,
    height,
    capThicknessNm,
    maxDepthNm,
    ridges,
    edge,
    readDepthNm,
    onReadDepth,
    onReadEnergy,
  } = props;
  const svg = useRef<SVGSVGElement>(null);
  const {
    x,
    left,
    right,
    ridges: ridgePanel,
    carriers,
    axisY,
  } = depthLayout({ width, height, capThicknessNm, maxDepthNm });
  const bases = ridgeBases(ridges, ridgePanel);
  const depthAt = (clientX: number) =>
    x.invert(clientX - (svg.current?.getBoundingClientRect().left ?? 0));

  const point = useFrame(
    ({ depthNm, energyKeV }: { depthNm: number | null; energyKeV: number | null }) => {
      onReadDepth(depthNm);
      onReadEnergy(energyKeV);
    },
  );
  const pointAt = (event: PointerEvent) => {
    const y = event.clientY - (svg.current?.getBoundingClientRect().top ?? 0);
    const inRidges = y < ridgePanel.top + ridgePanel.height;
    const nearest = bases.reduce<(typeof bases)[number] | null>(
      (best, base) => (best === null || Math.abs(base.y - y) < Math.abs(best.y - y) ? base : best),
      null,
    );
    point({
      depthNm: depthAt(event.clientX),
      energyKeV: inRidges ? (nearest?.energyKeV ?? null) : null,
    });
  };
  const leave = () => point({ depthNm: null, energyKeV: null });

  return (
    <svg
      ref={svg}
      width={width}
      height={height}
      className="absolute inset-0"
      role="group"
      aria-label="Handles of the depth figure"
    >
      <rect
        role="slider"
        tabIndex={0}
        aria-label="Depth to read the figure at"
        aria-valuemin={0}
        aria-valuemax={Math.round(maxDepthNm)}
        aria-valuenow={Math.round(readDepthNm ?? 0)}
        aria-valuetext={readDepthNm === null ? 'no depth' : `${withDecimals(readDepthNm, 1)} nm`}
        x={left}
        y={ridgePanel.top}
        width={right - left}
        height={axisY - ridgePanel.top}
        fill="transparent"
        onPointerMove={pointAt}
        onPointerLeave={leave}
        onKeyDown={(event) => {
          if (event.key === 'Escape') return onReadDepth(null);
          const moved = movedByKey(event.key, readDepthNm ?? 0, {
            step: maxDepthNm / 100,
            min: 0,
            max: maxDepthNm,
          });
          if (moved === null || event.ctrlKey || event.metaKey || event.altKey) return;
          event.preventDefault();
          onReadDepth(moved);
        }}
        onBlur={() => onReadDepth(null)}
        className="outline-none focus-visible:outline-2 focus-visible:outline-tide"
      />
      {readDepthNm !== null && readDepthNm >= -capThicknessNm && readDepthNm <= maxDepthNm && (
        <line
          x1={x(readDepthNm)}
          x2={x(readDepthNm)}
          y1={ridgePanel.top}
          y2={axisY}
          stroke="var(--ink-3)"
          strokeDasharray="2 3"
          pointerEvents="none"
        />
      )}
      {edge && (
        <DragHandle
          label="Edge depth"
          value={edge.valueNm}
          valueText={`${withDecimals(edge.valueNm, 1)} nm${edge.isDrawn ? ', drawn by hand' : ''}`}
          min={0}
          max={edge.limitNm}
          step={edge.stepNm}
          orientation="horizontal"
          valueAt={({ x: clientX }) => depthAt(clientX)}
          onMove={(value) => props.onMove('edgeDepthNm', value)}
          onDrop={() => props.onDrop('edgeDepthNm')}
          onClear={props.onClear}
        >
          <EdgeHandle
            at={x(edge.valueNm)}
            top={ridgePanel.top}
            bottom={axisY}
            handleY={carriers.top + carriers.height}
            drawn={edge.isDrawn}
          />
        </DragHandle>
      )}
    </svg>
  );
}

function EdgeHandle({
  at,
  top,
  bottom,
  handleY,
  drawn,
}: {
  at: number;
  top: number;
  bottom: number;
  handleY: number;
  drawn: boolean;
}) {
  return (
    <>
      <rect x={at - 12} y={top} width={24} height={bottom - top} fill="transparent" />
      {drawn && (
        <line
          x1={at}
          x2={at}
          y1={top}
          y2={bottom}
          stroke="var(--ink)"
          strokeWidth={1.25}
          strokeDasharray="6 3"
        />
      )}
      <circle
        cx={at}
        cy={handleY}
        r={11}
        fill="none"
        stroke="var(--tide)"
        strokeWidth={2}
        className="opacity-0 group-focus-visible:opacity-100"
      />
      <circle
        cx={at}
        cy={handleY}
        r={6.5}
        fill="var(--sheet)"
        stroke="var(--ink)"
        strokeWidth={1.75}
        className="group-hover:fill-coral"
      />
    </>
  );
}
