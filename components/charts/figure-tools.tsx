'use client';

import { useState, type ComponentProps, type MouseEvent, type ReactNode } from 'react';

import { withFonts } from './embed-fonts';
import { pngOf } from './export-png';
import { svgDocument } from './export-svg';
import { tableAsText, type FigureTable } from './figure-table';
import { saveAs } from './save-as';

interface FigureToolsProps {
  title: string;
  table: FigureTable;
  svgName: string;
  children: ReactNode;
}

/** Copies the data of a figure and saves its picture; says in words what it did. */
export function FigureTools({ title, table, svgName, children }: FigureToolsProps) {
  const [said, setSaid] = useState('');
  const press =
    (work: (svg: () => SVGSVGElement) => Promise<string>) => async (event: MouseEvent) => {
      const figure = event.currentTarget.closest('figure');
      try {
        setSaid(await work(() => shownSvg(figure)));
      } catch (error) {
        const reason = error instanceof Error ? error.message : 'the browser gave no reason';
        setSaid(`That did not work: ${reason}. Nothing was changed.`);
      }
    };
  return (
    <span className="no-print flex flex-wrap items-baseline gap-x-1 text-[0.8125rem] text-ink-2">
      <span role="status" className="mr-2 text-ink-3">
        {said}
      </span>
      {children}
      <Tool
        onClick={press(async () => {
          await navigator.clipboard.writeText(tableAsText(table));
          return 'Data copied.';
        })}
      >
        copy data
      </Tool>
      <Tool
        onClick={press(async (svg) => {
          saveAs(
            `${svgName}.svg`,
            new Blob([svgDocument(svg(), title)], { type: 'image/svg+xml' }),
          );
          return 'SVG saved.';
        })}
      >
        SVG
      </Tool>
      <Tool
        onClick={press(async (svg) => {
          const { width, height } = svg();
          saveAs(
            `${svgName}.png`,
            await pngOf(
              await withFonts(svgDocument(svg(), title)),
              width.baseVal.value,
              height.baseVal.value,
            ),
          );
          return 'PNG saved.';
        })}
      >
        PNG
      </Tool>
    </span>
  );
}

/** One word of a figure's title bar. */
export function Tool(props: ComponentProps<'button'>) {
  return (
    <button
      type="button"
      {...props}
      className="min-h-6 rounded-[3px] px-1.5 underline decoration-transparent underline-offset-4 hover:text-ink hover:decoration-coral aria-expanded:text-ink aria-pressed:text-ink aria-[expanded=true]:decoration-edge aria-[pressed=true]:decoration-edge"
    />
  );
}

function shownSvg(figure: Element | null): SVGSVGElement {
  const svg = figure?.querySelector('svg[role="img"]');
  if (!(svg instanceof SVGSVGElement)) throw new Error('the picture is not drawn yet');
  return svg;
}
