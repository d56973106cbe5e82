import { HELP_TOPICS } from './help-topics';

export function TopicList() {
  return (
    <nav aria-label="On this page" className="no-print lg:sticky lg:top-4 lg:self-start">
      <ol className="grid gap-x-6 text-sm sm:grid-cols-2 lg:grid-cols-1">
        {HELP_TOPICS.map((topic) => (
          <li key={topic.id}>
            <a
              href={`#${topic.id}`}
              className="block py-1 text-ink-2 hover:text-ink hover:underline"
            >
              {topic.title}
            </a>
          </li>
        ))}
      </ol>
    </nav>
  );
}
