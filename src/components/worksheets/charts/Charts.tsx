import { useEffect, useRef, type ReactNode } from 'react';
import { OrderDrawing } from '@/components/sheet/OrderDrawing';
import { stepThrough } from '@/components/sheet/orderSteps';
import { passWord } from '@/components/sheet/words';
import { formatMeasure } from '@/domain/measure/format';
import { show } from '@/domain/measure/said';
import type { BarsChart, Chart, OrderChart, ShapeChart } from '@/domain/worksheets/charts';
import type { Units } from '../asked';
import { Bars, BarsKey } from './Bars';
import { Shape, ShapeKey } from './Shape';

/** The numbers of a drawing as a table, for those who cannot see it and for copying. */
function Numbers({ caption, head, rows }: { caption: string; head: string[]; rows: string[][] }) {
  return (
    <details className="mt-1">
      <summary className="inline-flex min-h-7 cursor-pointer items-center underline decoration-rule underline-offset-[3px] print:hidden">
        {caption} in numbers
      </summary>
      <table className="mt-1 border-collapse text-left">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr className="border-b border-ink">
            {head.map((word, i) => (
              <th key={i} scope="col" className="px-3 py-1 text-small font-medium text-ink-2 first:pl-0">
                {word}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(([name = '', ...values]) => (
            <tr key={name} className="border-b border-hair">
              <th scope="row" className="py-1 pr-3 font-medium">
                {name}
              </th>
              {values.map((value, i) => (
                <td key={i} className="px-3 py-1">
                  {value}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </details>
  );
}

const Frame = ({ chart, legend, children }: { chart: Chart; legend?: ReactNode; children: ReactNode }) => (
  <figure className="break-inside-avoid">
    <figcaption className="font-serif text-lead font-bold">{chart.title}</figcaption>
    {legend}
    <div className="mt-2">{children}</div>
  </figure>
);

const cell = (chart: BarsChart | ShapeChart, units: Units) => (value: number | null | undefined) =>
  value === null || value === undefined ? 'not measured' : show(value, chart.unit, chart.fineness)[units];

const KINDS = {
  bars: (chart: BarsChart, units: Units) => (
    <Frame chart={chart} legend={<BarsKey chart={chart} />}>
      <Bars chart={chart} units={units} />
      <Numbers
        caption={chart.title}
        head={['', ...chart.series.map(({ label }) => label)]}
        rows={chart.items.map((item, i) => [item, ...chart.series.map(({ values }) => cell(chart, units)(values[i]))])}
      />
    </Frame>
  ),
  shape: (chart: ShapeChart, units: Units) => (
    <Frame chart={chart} legend={<ShapeKey chart={chart} />}>
      <Shape chart={chart} units={units} />
      <Numbers
        caption={chart.title}
        head={['', ...chart.axes.map(({ label }) => label)]}
        rows={chart.heights.map((name, i) => [
          name,
          ...chart.axes.map(({ diameters }) => cell(chart, units)(diameters[i])),
        ])}
      />
    </Frame>
  ),
  order: (chart: OrderChart) => (
    <Frame chart={chart}>
      <Stepped chart={chart} />
    </Frame>
  ),
};

/** The same drawing as on a sheet, gone through bolt by bolt. Drawn anew where the order is another. */
function Stepped({ chart }: { chart: OrderChart }) {
  const place = useRef<HTMLDivElement>(null);
  const id = JSON.stringify(chart);
  useEffect(() => {
    const figure = place.current?.querySelector<HTMLElement>('figure[data-order]');
    if (figure) stepThrough(figure);
  }, [id]);
  const rounds = chart.passes.map((torque, i) => ({
    name: i === chart.passes.length - 1 ? 'Final pass' : passWord(i + 1),
    text: formatMeasure(torque, 'N·m'),
  }));
  return (
    <div ref={place} key={id}>
      <OrderDrawing
        rounds={rounds}
        torque={{
          name: chart.title,
          positions: chart.positions.map(([right, down]) => [right * 1000, down * 1000]),
          order: chart.order,
        }}
      />
    </div>
  );
}

/** All drawings of an outcome. */
export const Charts = ({ charts, units }: { charts: readonly Chart[]; units: Units }) =>
  charts.map((chart) => (
    <div key={chart.title}>{(KINDS[chart.kind] as (chart: Chart, units: Units) => ReactNode)(chart, units)}</div>
  ));
