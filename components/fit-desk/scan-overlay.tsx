'use client';

import { useRef, useState, type KeyboardEvent } from 'react';

import type { ScanLayout } from '@/components/charts/scan-layout';
import { significant, withSigma } from '@/lib/format';
import type { ScanPoint } from '@/lib/inversion/index';

import { DragHandle } from './drag-handle';
import type { Drawable } from './drawn-values';

export interface LevelHandle {
  name: Extract<Drawable, 'levelTop' | 'levelBulk'>;
  label: string;
  value: number;
  isDrawn: boolean;
  step: number;
  min: number;
  max: number;
}

interface ScanOverlayProps {
  layout: ScanLayout;
  width: number;
  height: number;
  points: readonly ScanPoint[];
  offInScan: ReadonlySet<number>;
  levels: readonly LevelHandle[];
  unit: string;
  /** null on a saved fit. */
  onToggle: ((energyKeV: number) => void) | null;
  onReadEnergy: (energyKeV: number | null) => void;
  onMove: (name: Drawable, value: number) => void;
  onDrop: (name: Drawable) => void;
  onClear: () => void;
}

/** What can be touched in the scan figure: points to switch off, levels to drag. */
export function ScanOverlay(props: ScanOverlayProps) {
  const { layout, width, height, levels, unit } = props;
  const svg = useRef<SVGSVGElement>(null);
  const valueAt = (clientY: number) =>
    layout.y.invert(clientY - (svg.current?.getBoundingClientRect().top ?? 0));
  return (
    <svg
      ref={svg}
      width={width}
      height={height}
      className="absolute inset-0"
      role="group"
      aria-label="Points and levels of the scan"
    >
      {levels.map((level) => (
        <DragHandle
          key={level.name}
          label={level.label}
          value={level.value}
          valueText={`${significant(level.value, 4)} ${unit}${level.isDrawn ? ', drawn by hand' : ''}`}
          min={level.min}
          max={level.max}
          step={level.step}
          orientation="vertical"
          valueAt={({ y }) => valueAt(y)}
          onMove={(value) => props.onMove(level.name, value)}
          onDrop={() => props.onDrop(level.name)}
          onClear={props.onClear}
        >
          <LevelMark level={level} layout={layout} />
        </DragHandle>
      ))}
      <Points {...props} />
    </svg>
  );
}

const MARK_LENGTH = 26;

/** A short line with a knob: the surface level on the left, the bulk level on the right. */
function LevelMark({
  level,
  layout: { y, left, right, top, bottom },
}: {
  level: LevelHandle;
  layout: ScanLayout;
}) {
  const at = Math.min(bottom, Math.max(top, y(level.value)));
  const from = level.name === 'levelTop' ? left : right - MARK_LENGTH;
  const knob = level.name === 'levelTop' ? left : right;
  return (
    <>
      <rect x={from - 6} y={at - 12} width={MARK_LENGTH + 12} height={24} fill="transparent" />
      <line
        x1={from}
        x2={from + MARK_LENGTH}
        y1={at}
        y2={at}
        stroke="var(--coral)"
        strokeWidth={1.5}
        strokeDasharray={level.isDrawn ? '4 2' : undefined}
      />
      <circle
        cx={knob}
        cy={at}
        r={9}
        fill="none"
        stroke="var(--tide)"
        strokeWidth={2}
        className="opacity-0 group-focus-visible:opacity-100"
      />
      <circle
        cx={knob}
        cy={at}
        r={4.5}
        fill="var(--sheet)"
        stroke="var(--coral)"
        strokeWidth={1.75}
        className="group-hover:fill-coral"
      />
    </>
  );
}

/** One stop for the tab key; arrows go from point to point, space switches the point off or on. */
function Points({
  layout: { x, y },
  points,
  offInScan,
  unit,
  onToggle,
  onReadEnergy,
}: ScanOverlayProps) {
  const [current, setCurrent] = useState(0);
  const group = useRef<SVGGElement>(null);
  const order = points
    .map((_, index) => index)
    .sort((a, b) => points[a]!.energyKeV - points[b]!.energyKeV);

  const press = (event: KeyboardEvent, index: number) => {
    const place = order.indexOf(index);
    const next = { ArrowRight: place + 1, ArrowLeft: place - 1, Home: 0, End: order.length - 1 }[
      event.key
    ];
    const target = next === undefined ? undefined : order[next];
    if (target !== undefined) {
      event.preventDefault();
      setCurrent(target);
      group.current?.querySelector<SVGElement>(`[data-point="${target}"]`)?.focus();
    }
    if (event.key === ' ') {
      event.preventDefault();
      toggle(index);
    }
  };
  const toggle = (index: number) => {
    const point = points[index];
    if (point && !offInScan.has(point.energyKeV)) onToggle?.(point.energyKeV);
  };

  return (
    <g ref={group}>
      {points.map((point, index) => {
        const fixed = onToggle === null || offInScan.has(point.energyKeV);
        const [cx, cy] = [x(point.energyKeV), y(point.value)];
        return (
          <g
            key={point.energyKeV}
            data-point={index}
            role="checkbox"
            aria-checked={point.enabled}
            aria-disabled={fixed || undefined}
            aria-label={`${point.energyKeV} keV, ${withSigma(point.value, point.sigma)} ${unit}, in use`}
            tabIndex={index === Math.min(current, points.length - 1) ? 0 : -1}
            onClick={() => toggle(index)}
            onKeyDown={(event) => press(event, index)}
            onFocus={() => {
              setCurrent(index);
              onReadEnergy(point.energyKeV);
            }}
            onBlur={() => onReadEnergy(null)}
            onPointerEnter={() => onReadEnergy(point.energyKeV)}
            onPointerLeave={() => onReadEnergy(null)}
            className={`group outline-none ${fixed ? '' : 'cursor-pointer'}`}
          >
            <circle cx={cx} cy={cy} r={12} fill="transparent" />
            <circle
              cx={cx}
              cy={cy}
              r={11}
              fill="none"
              stroke="var(--tide)"
              strokeWidth={2}
              className="opacity-0 group-focus-visible:opacity-100"
            />
          </g>
        );
      })}
    </g>
  );
}
