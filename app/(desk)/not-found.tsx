import { NothingHere } from '@/components/shell/nothing-here';

export default function DeskNotFound() {
  return <NothingHere />;
}
