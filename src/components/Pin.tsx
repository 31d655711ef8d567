import { FaultMark } from './FaultMark.tsx';
import { toStage, type View } from './photo-geometry.ts';

export interface PlacedMark {
  x: number;
  y: number;
  width?: number | null;
  height?: number | null;
}

interface PinProps {
  mark: PlacedMark;
  view: View;
  fault: string;
  name: string;
  severity?: number | undefined;
  isChosen?: boolean;
  onChoose?: () => void;
  /** Arrow keys: share of the picture to move by. */
  onMove?: (dx: number, dy: number) => void;
}

const STEP = 0.01;
const LEAP = 0.05;

/** A mark on a photo: a white plate with the fault's mark, and an outlined area where it is one. The chosen one is yellow. */
export function Pin({ mark, view, fault, name, severity, isChosen = false, onChoose, onMove }: PinProps) {
  const at = toStage(view, mark);
  const isArea = Boolean(mark.width && mark.height);
  const end = isArea ? toStage(view, { x: mark.x + (mark.width ?? 0), y: mark.y + (mark.height ?? 0) }) : at;
  const tint = isChosen ? 'border-pin' : 'border-[#fff]';
  return (
    <>
      {isArea && <div aria-hidden="true" className={`pointer-events-none absolute rounded-[2px] border-[2.5px] outline-2 outline-[#17191a] ${tint}`} style={{ left: `${at.x * 100}%`, top: `${at.y * 100}%`, width: `${(end.x - at.x) * 100}%`, height: `${(end.y - at.y) * 100}%` }} />}
      <button
        type="button"
        aria-label={`${name}${severity ? `, severity ${severity}` : ''}, ${isArea ? 'area' : 'point'}`}
        aria-pressed={isChosen}
        className={`absolute flex coarse:before:absolute coarse:before:-inset-x-1 coarse:before:-inset-y-2 coarse:before:content-[''] min-h-8 items-center rounded-bar px-1 ring-2 ring-[#17191a] [--color-ink:#17191a] [--color-lift:#fdfdfc] ${isChosen ? 'z-10 bg-pin' : 'bg-[#fdfdfc]'} text-[#17191a] ${isArea ? 'translate-x-2 -translate-y-3/5' : '-translate-x-1/2 -translate-y-[calc(100%+9px)]'}`}
        style={{ left: `${at.x * 100}%`, top: `${at.y * 100}%` }}
        onClick={onChoose}
        onKeyDown={(event) => {
          const step = event.shiftKey ? LEAP : STEP;
          const moves: Record<string, readonly [number, number]> = { ArrowLeft: [-step, 0], ArrowRight: [step, 0], ArrowUp: [0, -step], ArrowDown: [0, step] };
          const by = moves[event.key];
          if (!by || !onMove) return;
          event.preventDefault();
          onMove(by[0], by[1]);
        }}
      >
        <FaultMark fault={fault} name={name} size={24} {...(severity ? { severity } : {})} />
        {!isArea && <span aria-hidden="true" className="absolute -bottom-[9px] left-1/2 h-[9px] w-[3px] -translate-x-1/2 bg-[#17191a] ring-1 ring-[#fdfdfc]" />}
      </button>
    </>
  );
}
