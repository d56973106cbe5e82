import type { Metadata } from 'next';

import { CautionsSection } from '@/components/help/cautions-section';
import { ChecksSection } from '@/components/help/checks-section';
import { CompareSection } from '@/components/help/compare-section';
import { DigitsSection } from '@/components/help/digits-section';
import { FilesSection } from '@/components/help/files-section';
import { FitSection } from '@/components/help/fit-section';
import { IntervalsSection } from '@/components/help/intervals-section';
import { ReachSection } from '@/components/help/reach-section';
import { ResponseSection } from '@/components/help/response-section';
import { ReviewSection } from '@/components/help/review-section';
import { SourcesSection } from '@/components/help/sources-section';
import { StoppingSection } from '@/components/help/stopping-section';
import { TopicList } from '@/components/help/topic-list';
import { TrialSection } from '@/components/help/trial-section';
import { WhatSection } from '@/components/help/what-section';
import { PageHeader } from '@/components/ui/page-header';

import { TEMPLATES } from './templates/templates';

export const metadata: Metadata = { title: 'Help' };

export default function HelpPage() {
  const templates = TEMPLATES.map(({ fileName, about }) => ({ fileName, about }));
  return (
    <>
      <PageHeader
        title="Help"
        meta={['how each number is computed, with its source', 'file templates']}
      />
      <div className="grid gap-8 pt-6 lg:grid-cols-[14rem_minmax(0,44rem)] lg:gap-14">
        <TopicList />
        <div className="-mt-7 min-w-0">
          <WhatSection />
          <FilesSection templates={templates} />
          <StoppingSection />
          <TrialSection />
          <ResponseSection />
          <FitSection />
          <IntervalsSection />
          <CompareSection />
          <ReachSection />
          <ChecksSection />
          <DigitsSection />
          <ReviewSection />
          <CautionsSection />
          <SourcesSection />
        </div>
      </div>
    </>
  );
}
