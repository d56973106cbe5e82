import { Notice } from '@/components/ui/notice';
import { significant } from '@/lib/format';
import type { CarrierProfile } from '@/lib/inversion/index';

/** What a reader of the numbers must know before using them. */
export function ProfileCautions({ profile }: { profile: CarrierProfile }) {
  const isShare = profile.unit === 'populated share';
  return (
    <div className="grid gap-3">
      <Notice kind="caution" title="An estimate that depends on its model">
        A fitted profile is a model-dependent estimate, valid only within its reach of{' '}
        <span className="figures whitespace-nowrap">{significant(profile.reachNm)} nm</span>. It
        does not replace process qualification.
      </Notice>
      <Notice kind="caution" title="Carriers, never doping">
        {isShare ? 'The populated share' : 'The concentration'} is that of carriers. Inside a
        depletion layer it differs from the doping.
      </Notice>
    </div>
  );
}
