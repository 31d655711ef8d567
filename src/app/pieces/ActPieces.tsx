import { useState } from 'react';
import { BarPicker, type BarAnswer } from '#src/components/BarPicker.tsx';
import { Block } from '#src/components/Block.tsx';
import { Caution, Soft } from '#src/components/Caution.tsx';
import { Choice } from '#src/components/Choice.tsx';
import { Flag } from '#src/components/Flag.tsx';
import { ProgressBar } from '#src/components/ProgressBar.tsx';
import { Rail } from '#src/components/Rail.tsx';
import { SeverityPicker } from '#src/components/SeverityPicker.tsx';
import { useToasts } from '#src/components/Toasts.tsx';

const BARS: BarAnswer[] = ['clear', 'clear', 'found', 'found', 'clear', 'clear', 'clear', 'not-checked', 'clear', 'clear', 'clear', 'clear'];

function Blocks() {
  const { tell } = useToasts();
  return (
    <section className="grid content-start gap-4">
      <Rail heading="Blocks, flags, cautions" />
      <div className="flex flex-wrap gap-3">
        <Block kind="main" onClick={() => tell('Finding kept', () => tell('Taken back'))}>Keep</Block>
        <Block>Look</Block>
        <Block kind="quiet">Leave for now</Block>
        <Block kind="stop">Hold the batch</Block>
        <Block waitsFor="Scent waits for the check">Scent in</Block>
        <Block kind="main" busy="Keeping …">Keep</Block>
      </div>
      <Block kind="main" size="bench">Keep, on the bench</Block>
      <div className="flex flex-wrap items-center gap-2">
        <Flag kind="late">6 days late</Flag><Flag kind="today">today</Flag><Flag kind="held">held: excess lye</Flag><Flag kind="passed">alkalinity passed</Flag><Flag kind="draft">draft</Flag>
      </div>
      <Caution>Wear goggles and gloves. Pour the lye into the water, never the water onto the lye.</Caution>
      <Soft>Water to lye 2.9 is more than usual here: 2.0 to 2.4.</Soft>
      <ProgressBar done={3} of={8} label="3 of 8 photos sent" />
    </section>
  );
}

/** What is pressed and what is picked, in all its states. */
export function ActPieces() {
  const [bars, setBars] = useState(BARS);
  const [answer, setAnswer] = useState<'found' | 'clear' | 'not-checked'>('clear');
  const [severity, setSeverity] = useState(2);
  return (
    <>
      <Blocks />
      <section className="grid content-start gap-4">
        <Rail heading="Pickers" aside="arrow keys move, tap and hold say" />
        <Choice label="Soda ash" value={answer} onChange={setAnswer} options={[{ value: 'found', label: 'found', tone: 'found' }, { value: 'clear', label: 'clear' }, { value: 'not-checked', label: 'not looked at' }]} />
        <SeverityPicker criteria={['A veil that wipes off', 'White bloom on most of the top', 'A crust that hides the colour']} value={severity} onChange={setSeverity} />
        <BarPicker bars={bars} onChange={setBars} />
      </section>
    </>
  );
}
