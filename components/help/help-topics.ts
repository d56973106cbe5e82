/** The parts of the help page in their order; the ids are addresses that other pages link to. */
export const HELP_TOPICS = [
  { id: 'what', title: 'What a profile is, and is not' },
  { id: 'files', title: 'Files in' },
  { id: 'stopping', title: 'Stopping profiles' },
  { id: 'trial', title: 'Trial profiles' },
  { id: 'response', title: 'What the probe sees' },
  { id: 'fit', title: 'The fit' },
  { id: 'intervals', title: 'Intervals and bands' },
  { id: 'compare', title: 'Comparing models' },
  { id: 'reach', title: 'Reach, floor and information' },
  { id: 'checks', title: 'Checks' },
  { id: 'digits', title: 'How numbers are written' },
  { id: 'review', title: 'Review, issue, export' },
  { id: 'cautions', title: 'Cautions' },
  { id: 'sources', title: 'Sources' },
] as const;

export type HelpTopic = (typeof HELP_TOPICS)[number]['id'];

export function titleOf(id: HelpTopic): string {
  return HELP_TOPICS.find((topic) => topic.id === id)!.title;
}
