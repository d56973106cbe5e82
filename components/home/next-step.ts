import type { FitRow } from '@/lib/schemas/fit';

/** What a person does next with a fit that waits for them, and where. */
export function nextStep(fit: FitRow): { label: string; href: string } {
  switch (fit.state) {
    case 'submitted':
      return { label: 'Review', href: `/reviews/${fit.id}` };
    case 'returned':
      return { label: 'Read the reasons and revise', href: `/fits/${fit.id}` };
    case 'draft':
      return { label: 'Go on', href: `/fits/${fit.id}` };
    case 'accepted':
      return { label: 'Open', href: `/fits/${fit.id}` };
  }
}
