import { ButtonLink } from '@/components/ui/button-link';
import type { FormActionFunction } from '@/components/ui/form-state';
import { InventedMark } from '@/components/ui/invented-mark';
import { Moment } from '@/components/ui/moment';
import { PageHeader } from '@/components/ui/page-header';
import { StateBadge } from '@/components/ui/state-badge';
import { formatProbability, withDecimals } from '@/lib/format';
import type { Fit, FitRow } from '@/lib/schemas/fit';

import { CheckList } from './check-list';
import { CommentForm } from './comment-form';
import { commentTargets } from './comment-targets';
import { Decision } from './decision';
import { drawnFit, fileNameOf } from './drawn-fit';
import { EdgeAnswer } from './edge-answer';
import { SavedDepthFigure, SavedScanFigure } from './fit-figures';
import { FrozenInputs } from './frozen-inputs';
import { ParameterTable } from './parameter-table';
import { ReviewStanding } from './review-standing';
import { submittedAt } from './review-queue';
import type { SavedFitFigures } from './saved-fit-figures';
import { scaleErrorOf } from './scale-error';
import { SettingList } from './setting-list';
import { SiblingFits } from './sibling-fits';
import { Thread } from './thread';
import { waitingWords } from './waiting-words';

interface ReviewViewProps {
  fit: Fit;
  own: boolean;
  figures: SavedFitFigures;
  carrier: 'electrons' | 'holes';
  /** Other fits of the same scan. */
  others: FitRow[];
  now: Date;
  /** The point that the address points at. */
  litKeV: number | null;
  actions: {
    accept: FormActionFunction<unknown>;
    return: FormActionFunction;
    comment: FormActionFunction;
  };
}

/** One fit as a reviewer needs it: the answer, what it rests on, what speaks against it, and what was said. */
export function ReviewView(props: ReviewViewProps) {
  const { fit, own, figures, carrier, others, now, litKeV, actions } = props;
  const drawn = drawnFit(fit);
  const fileName = fileNameOf(fit.name);
  const scale = scaleErrorOf(fit.spec);
  const { chiSquare, degreesOfFreedom, pValue } = fit.answer;
  return (
    <>
      <PageHeader
        breadcrumb={[
          { label: 'Reviews', href: '/reviews' },
          { label: fit.sampleName, href: `/samples/${fit.sampleId}` },
          { label: fit.scanName, href: `/scans/${fit.scanId}` },
        ]}
        title={fit.name}
        badge={
          <>
            <StateBadge state={fit.state} />
            {fit.invented && <InventedMark />}
          </>
        }
        meta={[
          `${fit.profile} edge, ${fit.spec.polarity}`,
          `by ${fit.createdBy}`,
          <span key="made">
            made <Moment at={fit.createdAt} />
          </span>,
          fit.state === 'submitted' && `waiting ${waitingWords(submittedAt(fit), now)}`,
        ]}
        actions={
          <>
            <ButtonLink href={`/fits/${fit.id}`}>Open on the fit desk</ButtonLink>
            <Decision
              fitId={fit.id}
              fitName={fit.name}
              may={fit.may}
              acceptAction={actions.accept}
              returnAction={actions.return}
            />
          </>
        }
      />
      <ReviewStanding fit={fit} own={own} />
      <section
        aria-label="The answer"
        className="flex flex-wrap items-start justify-between gap-6 py-6"
      >
        <EdgeAnswer edge={fit.edge} width={fit.width} polarity={fit.spec.polarity} />
        <p className="text-sm text-ink-2">
          χ² <span className="figures">{withDecimals(chiSquare, 2)}</span> for {degreesOfFreedom}{' '}
          degrees of freedom
          {pValue !== null && (
            <>
              , p <span className="figures">{formatProbability(pValue)}</span>
            </>
          )}
        </p>
      </section>
      <div className="grid gap-8 lg:grid-cols-2">
        <div id="scan" className="min-w-0">
          <SavedScanFigure fit={drawn} figures={figures} fileName={fileName} litKeV={litKeV} />
        </div>
        <div id="depth" className="min-w-0">
          <SavedDepthFigure
            fit={drawn}
            figures={figures}
            carrier={carrier}
            fileName={fileName}
            litKeV={litKeV}
          />
          {scale && <p className="mt-1 text-[0.8125rem] text-ink-2">{scale.sentence}</p>}
        </div>
      </div>
      <div className="mt-10 grid gap-x-10 gap-y-10 lg:grid-cols-2">
        <div className="grid min-w-0 content-start gap-10">
          <section aria-labelledby="parameters">
            <h2 id="parameters" className="mb-2">
              Parameters
            </h2>
            <ParameterTable fit={fit} />
          </section>
          <section aria-labelledby="settings">
            <h2 id="settings" className="mb-2">
              What is assumed
            </h2>
            <SettingList fit={fit} />
          </section>
          <section aria-labelledby="frozen">
            <h2 id="frozen" className="mb-2">
              Frozen inputs
            </h2>
            <FrozenInputs fit={fit} />
          </section>
        </div>
        <div className="grid min-w-0 content-start gap-10">
          <section aria-labelledby="checks">
            <h2 id="checks" className="mb-2">
              Checks
            </h2>
            <CheckList checks={fit.checks} />
          </section>
          <section aria-labelledby="siblings">
            <h2 id="siblings" className="mb-2">
              Other fits of this scan
            </h2>
            <SiblingFits fit={fit} others={others} />
          </section>
          <section aria-labelledby="thread" className="grid gap-4">
            <h2 id="thread">What was said</h2>
            {fit.notes !== '' && (
              <p className="prose-measure text-sm whitespace-pre-line text-ink-2">
                <strong className="font-semibold text-ink">Notes of {fit.createdBy}.</strong>{' '}
                {fit.notes}
              </p>
            )}
            <Thread events={fit.events} />
            {fit.may.comment && (
              <CommentForm fitId={fit.id} groups={commentTargets(fit)} action={actions.comment} />
            )}
          </section>
        </div>
      </div>
    </>
  );
}
