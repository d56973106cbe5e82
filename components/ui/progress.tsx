import { cn } from './cn';

type ProgressProps = {
  /** Said by a screen reader: "Resampling". */
  label: string;
  /** null: under way, no share known. */
  value: number | null;
  max: number;
  className?: string;
};

export function Progress({ label, value, max, className }: ProgressProps) {
  return (
    <progress
      aria-label={label}
      value={value ?? undefined}
      max={max}
      className={cn(
        'block h-[3px] w-full appearance-none bg-rule [&::-moz-progress-bar]:bg-coral [&::-webkit-progress-bar]:bg-rule [&::-webkit-progress-value]:bg-coral',
        className,
      )}
    />
  );
}
