'use client';

import { useRef, type KeyboardEvent, type PointerEvent, type ReactNode } from 'react';

import { movedByKey } from './drawn-values';
import { useFrame } from './use-frame';

interface DragHandleProps {
  label: string;
  value: number;
  /** The value with its unit, said by a screen reader. */
  valueText: string;
  min: number;
  max: number;
  /** One press of an arrow key. */
  step: number;
  orientation: 'horizontal' | 'vertical';
  /** Value under a point of the page. */
  valueAt: (point: { x: number; y: number }) => number;
  onMove: (value: number) => void;
  onDrop: () => void;
  /** Back to the fit. */
  onClear: () => void;
  children: ReactNode;
}

/** Something in a figure that is moved by pointer or keys. It moves at most once a frame and fits nothing. */
export function DragHandle({
  label,
  value,
  valueText,
  min,
  max,
  step,
  orientation,
  valueAt,
  onMove,
  onDrop,
  onClear,
  children,
}: DragHandleProps) {
  const dragging = useRef(false);
  const moveSoon = useFrame(onMove);
  const clamp = (next: number) => Math.min(max, Math.max(min, next));

  const grab = (event: PointerEvent<SVGGElement>) => {
    if (event.button !== 0) return;
    dragging.current = true;
    event.currentTarget.setPointerCapture(event.pointerId);
    event.currentTarget.focus();
  };
  const drag = (event: PointerEvent<SVGGElement>) => {
    if (!dragging.current) return;
    event.stopPropagation();
    moveSoon(clamp(valueAt({ x: event.clientX, y: event.clientY })));
  };
  const release = () => {
    if (!dragging.current) return;
    dragging.current = false;
    // After the frame that draws the last move.
    requestAnimationFrame(() => requestAnimationFrame(onDrop));
  };
  const press = (event: KeyboardEvent<SVGGElement>) => {
    if (event.key === 'Escape') return onClear();
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const moved = movedByKey(event.key, value, { step, min, max });
    if (moved === null) return;
    event.preventDefault();
    onMove(moved);
  };
  const lift = (event: KeyboardEvent<SVGGElement>) => {
    if (movedByKey(event.key, value, { step, min, max }) !== null) onDrop();
  };

  return (
    <g
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-orientation={orientation}
      aria-valuemin={min}
      aria-valuemax={max}
      aria-valuenow={value}
      aria-valuetext={valueText}
      onPointerDown={grab}
      onPointerMove={drag}
      onPointerUp={release}
      onPointerCancel={release}
      onKeyDown={press}
      onKeyUp={lift}
      className={`group touch-none outline-none ${orientation === 'horizontal' ? 'cursor-ew-resize' : 'cursor-ns-resize'}`}
    >
      {children}
    </g>
  );
}
