import { ButtonLink } from '@/components/ui/button-link';
import { Mark } from '@/components/ui/mark';
import { TextLink } from '@/components/ui/text-link';
import type { Home } from '@/lib/schemas/home';

type FirstStepsProps = { counts: Home['counts'] };

type Step = { done: boolean; title: string; text: string; label: string; href: string };

/** The way from an empty team to a first fit; the next step has the button. */
export function FirstSteps({ counts }: FirstStepsProps) {
  const steps = stepsFor(counts);
  const next = steps.findIndex((step) => !step.done);
  return (
    <div className="grid prose-measure gap-3">
      <ol className="border-t border-rule">
        {steps.map((step, index) => (
          <li key={step.title} className="flex gap-3.5 border-b border-rule py-3.5">
            <span className="w-5 shrink-0 pt-0.5 font-serif text-lg leading-none font-semibold">
              {step.done ? <Mark kind="fine" /> : index + 1}
            </span>
            <div className="grid justify-items-start gap-1">
              <p className={step.done ? 'text-ink-2' : 'font-semibold'}>
                {step.title}
                {step.done && <span className="sr-only"> (done)</span>}
              </p>
              {!step.done && <p className="text-sm text-ink-2">{step.text}</p>}
              {index === next && (
                <ButtonLink variant="primary" size="small" href={step.href} className="mt-1.5">
                  {step.label}
                </ButtonLink>
              )}
            </div>
          </li>
        ))}
      </ol>
      <p className="text-sm text-ink-2">
        No files at hand? <TextLink href="/help#files">Take the file templates</TextLink>: invented
        numbers in the right shape, to try the whole way.
      </p>
    </div>
  );
}

function stepsFor(counts: Home['counts']): Step[] {
  return [
    {
      done: counts.samples > 0,
      title: 'Add a sample',
      text: 'The wafer, its material and, if known, its doping and cap layer.',
      label: 'Add a sample',
      href: '/samples/new',
    },
    {
      done: counts.stoppingSets > 0,
      title: 'Add a stopping set',
      text: 'Where the muons stop at each implantation energy, from a stopping calculation of the layer stack.',
      label: 'Add a stopping set',
      href: '/stopping/new',
    },
    {
      done: counts.scans > 0,
      title: 'Add an energy scan',
      text: 'Energy, value and uncertainty: a file, a paste from a spreadsheet, or typed.',
      label: 'Choose the sample',
      href: '/samples',
    },
    {
      done: counts.fits > 0,
      title: 'Fit',
      text: 'Scan and stopping set together give the depth of the edge with its interval.',
      label: 'Go to the fit desk',
      href: '/fits/new',
    },
  ];
}
