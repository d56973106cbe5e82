'use client';

import { useId, useState, type ReactNode } from 'react';

import { cn } from '@/components/ui/cn';

import { FigureDataTable } from './figure-data-table';
import type { FigureTable } from './figure-table';
import { FigureTools, Tool } from './figure-tools';
import { useWidth } from './use-width';

interface FigureProps {
  title: string;
  /** The numbers behind the picture. */
  table: FigureTable;
  /** Shown in place of the plain table, where cells can be worked on. */
  tableView?: ReactNode;
  /** Name of a saved file, without its ending. */
  svgName: string;
  /** Height of the picture, kept free until it can be drawn, px. */
  height: number;
  /** Draws the picture at a measured width, or is the picture. */
  children: ReactNode | ((width: number) => ReactNode);
  /** Between the title and the picture, such as the one number of the page. */
  lead?: ReactNode;
  /** Under the picture, such as what it says at the pointer. */
  foot?: ReactNode;
  className?: string;
}

const NARROWEST = 240;

/** A picture with its title bar: the table behind it, its data for the clipboard, SVG and PNG. */
export function Figure({
  title,
  table,
  tableView,
  svgName,
  height,
  children,
  lead,
  foot,
  className,
}: FigureProps) {
  const [titleId, tableId] = [useId(), useId()];
  const [tableOpen, setTableOpen] = useState(false);
  const [frame, width] = useWidth<HTMLDivElement>();
  return (
    <figure aria-labelledby={titleId} className={cn('min-w-0', className)}>
      <figcaption className="mb-1 flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
        <h2 id={titleId} className="text-sm text-ink-2">
          {title}
        </h2>
        <FigureTools title={title} table={table} svgName={svgName}>
          <Tool
            onClick={() => setTableOpen(!tableOpen)}
            aria-expanded={tableOpen}
            aria-controls={tableId}
          >
            table
          </Tool>
        </FigureTools>
      </figcaption>
      {lead}
      <div ref={frame} className="relative overflow-x-auto">
        {/* An empty svg keeps the room of the picture, so that nothing moves when it is drawn. */}
        {width === null && (
          <svg width="100%" height={height} aria-hidden="true" className="block" />
        )}
        {width !== null &&
          (typeof children === 'function' ? children(Math.max(width, NARROWEST)) : children)}
      </div>
      {foot}
      <div id={tableId} hidden={!tableOpen}>
        {tableOpen && (tableView ?? <FigureDataTable caption={title} table={table} />)}
      </div>
    </figure>
  );
}
