import { Block } from '#src/components/Block.tsx';
import { Rail } from '#src/components/Rail.tsx';

/** All pieces together, for whoever works on them. */
export function Component() {
  return (
    <div className="grid gap-9">
      <h1>Pieces</h1>
      <section className="grid gap-4">
        <Rail heading="Blocks" />
        <div className="flex flex-wrap gap-3">
          <Block kind="main">Keep</Block>
          <Block>Look</Block>
          <Block kind="quiet">Leave for now</Block>
          <Block kind="stop">Hold the batch</Block>
          <Block waitsFor="Scent waits for the check">Scent in</Block>
          <Block kind="main" busy="Keeping …">Keep</Block>
        </div>
      </section>
    </div>
  );
}
