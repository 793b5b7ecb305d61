import { Caution } from '../../../src/components/Caution';
import { GoButton } from '../../../src/components/GoButton';
import { MediaRow } from '../../../src/components/MediaRow';
import { PageTitle } from '../../../src/components/PageTitle';
import { StickyAction } from '../../../src/components/StickyAction';
import { TapeStrip } from '../../../src/components/TapeStrip';

function BlockHead({ kind, name, how }: { kind: 'warm-up' | 'workout'; name: string; how: string }) {
  return (
    <h2 className="flex items-center gap-3 pt-4 text-base font-extrabold">
      <TapeStrip kind={kind} className="w-22" />
      {name}
      <span className="ms-auto text-sm font-normal text-ink2">{how}</span>
    </h2>
  );
}

export function FloorPage() {
  return (
    <>
      <p className="mb-2 text-sm text-ink2">
        <b>Tue 3 March</b> · Quayside team
      </p>
      <PageTitle title="Step, row, skip" />
      <p className="mt-1.5 text-sm text-ink2">
        About 46 min. Made for your hotel kit: <b className="text-ink">2 lines changed</b>.
      </p>
      <BlockHead kind="warm-up" name="Warm-up" how="6 min easy" />
      <ul className="border-b-thin border-line">
        <MediaRow title="Air squat" to="/a" still={{ src: null, length: '0:31' }} figure="10" />
      </ul>
      <BlockHead kind="workout" name="Workout" how="AMRAP 12" />
      <ul>
        <MediaRow
          title="Box step-up"
          to="/b"
          still={{ src: null, length: '0:48' }}
          notes={['Whole foot on the box']}
          figure="6 / side"
        />
        <MediaRow
          title="Towel row"
          to="/c"
          still={{ src: null, length: '0:40' }}
          notes={[
            <span key="for">
              for <s>ring row</s> · nothing to hang from
            </span>,
          ]}
          figure="10"
        />
        <MediaRow title="Line hop" to="/d" still={{ src: null }} notes={['no demo yet']} figure="30" />
      </ul>
      <Caution todo="Clear the floor before you hop.">Stop on sharp pain, chest pain or dizziness.</Caution>
      <p className="mt-3 text-sm text-ink2">
        Aim for <b className="text-ink">7 to 9 rounds</b> · 80 to 100 s a round, steady
      </p>
      <StickyAction>
        <GoButton size="large">Start the clock · 12:00</GoButton>
      </StickyAction>
    </>
  );
}
