import { Caution } from '#src/components/Caution.tsx';

/** Where lye is weighed and soap is cooked: said once on a screen, unshortened. */
export function LyeCaution({ isHot }: { isHot: boolean }) {
  return (
    <Caution>
      <p>Lye burns skin and blinds eyes. Goggles that seal, gloves, long sleeves, apron. Nobody else near, air moving.</p>
      <p>Lye into cold water, slowly, stirring. Never water onto lye. It gets nearly boiling.</p>
      <p>No aluminium near lye: it fizzes off hydrogen, which burns.</p>
      <p>All beads dissolved? Undissolved lye makes burning holes in the soap.</p>
      {isHot && (
        <>
          <p>Stay with a cooking batch. Pot no more than half full. If it climbs: heat off, stir, stand back.</p>
          <p>Hot soap sticks and burns twice: heat and lye. Eyes first: rinse, then ring.</p>
        </>
      )}
    </Caution>
  );
}
