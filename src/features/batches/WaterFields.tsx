import { useController } from 'react-hook-form';
import { QuantityField } from '#src/components/QuantityField.tsx';
import type { BatchDraft } from './batch-draft.ts';
import { useFieldSays } from './form-fields.tsx';
import { useWaterPair } from './water-pair.ts';

/** Water to lye and lye concentration: type either, the other follows. */
export function WaterFields() {
  const { field } = useController<BatchDraft, 'waterToLye'>({ name: 'waterToLye' });
  const { error, warning } = useFieldSays('waterToLye');
  const pair = useWaterPair(field.value, field.onChange);
  return (
    <>
      <QuantityField label="Water to lye, by mass" quantity="plain" sign=": 1" hint="Concentration follows" value={pair.ratio} onChange={pair.setRatio} onBlur={field.onBlur} error={error} warning={warning} />
      <QuantityField label="Lye concentration" quantity="percent" hint="Or type this one" value={pair.concentration} onChange={pair.setConcentration} onBlur={field.onBlur} error={error ? 'Lye concentration must lie between 15 and 50 %' : undefined} />
    </>
  );
}
