import { act, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { BarPicker, type BarAnswer } from '#src/components/BarPicker.tsx';
import { Block } from '#src/components/Block.tsx';
import { Choice } from '#src/components/Choice.tsx';
import { QuantityField } from '#src/components/QuantityField.tsx';
import { SeverityPicker } from '#src/components/SeverityPicker.tsx';
import { Strip } from '#src/components/Strip.tsx';

function Bars({ count }: { count: number }) {
  const [bars, setBars] = useState<BarAnswer[]>(Array.from({ length: count }, () => 'clear'));
  return <BarPicker bars={bars} onChange={setBars} />;
}

describe('BarPicker', () => {
  it('counts bars with the fault of bars looked at', async () => {
    render(<Bars count={12} />);
    const user = userEvent.setup();
    await user.click(screen.getByRole('button', { name: 'Bar 8' }));
    await user.click(screen.getByRole('button', { name: 'Bar 9' }));
    expect(screen.getByText('2 of 12')).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Bar 9' }));
    expect(screen.getByText('1 of 12')).toBeInTheDocument();
  });

  it('takes a bar that was not looked at out of the count, by keyboard', async () => {
    render(<Bars count={6} />);
    const user = userEvent.setup();
    screen.getByRole('button', { name: 'Bar 1' }).focus();
    await user.keyboard('{Delete}{ArrowRight} ');
    expect(screen.getByText('1 of 5')).toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Bar 1, not looked at' })).toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Bar 2' })).toHaveAttribute('aria-pressed', 'true');
  });
});

describe('BarPicker under a finger', () => {
  it('says not looked at while a bar is held', () => {
    vi.useFakeTimers();
    render(<Bars count={6} />);
    fireEvent.pointerDown(screen.getByRole('button', { name: 'Bar 3' }));
    act(() => vi.advanceTimersByTime(500));
    vi.useRealTimers();
    expect(screen.getByRole('button', { name: 'Bar 3, not looked at' })).toBeInTheDocument();
    expect(screen.getByText('0 of 5')).toBeInTheDocument();
  });

  it('paints the bars that a finger is drawn across, all alike', () => {
    render(<Bars count={6} />);
    const bar = (number: number) => screen.getByRole('button', { name: `Bar ${number}` });
    fireEvent.pointerDown(bar(2));
    for (const number of [3, 4]) {
      const under = vi.spyOn(document, 'elementFromPoint').mockReturnValue(bar(number));
      fireEvent.pointerMove(bar(2));
      under.mockRestore();
    }
    fireEvent.pointerUp(bar(2));
    fireEvent.pointerMove(bar(2));
    expect(screen.getByText('3 of 6')).toBeInTheDocument();
  });

  it('hears the press of a screen reader, which has no pointer', () => {
    render(<Bars count={6} />);
    fireEvent.click(screen.getByRole('button', { name: 'Bar 1' }), { detail: 0 });
    expect(screen.getByText('1 of 6')).toBeInTheDocument();
  });
});

describe('Choice', () => {
  it('moves with the arrow keys and says what stands', async () => {
    const onChange = vi.fn();
    render(<Choice label="Soda ash" value="clear" options={[{ value: 'found', label: 'found' }, { value: 'clear', label: 'clear' }]} onChange={onChange} />);
    screen.getByRole('radio', { name: 'clear' }).focus();
    await userEvent.keyboard('{ArrowLeft}');
    expect(onChange).toHaveBeenCalledWith('found');
  });
});

describe('SeverityPicker', () => {
  it('never shows a number without its criterion, nor a severity that does not exist', () => {
    render(<SeverityPicker criteria={[null, null, 'Holds liquid']} value={3} onChange={() => undefined} />);
    expect(screen.getAllByRole('radio')).toHaveLength(1);
    expect(screen.getByRole('radio')).toHaveAccessibleName(/Severity 3:\s*Holds liquid/);
  });
});

describe('QuantityField', () => {
  function Field({ onValue }: { onValue: (value: number | null) => void }) {
    const [value, setValue] = useState<number | null>(40);
    return <QuantityField label="Oil temperature" quantity="temperature" units={{ temperatureUnit: 'fahrenheit', massUnit: 'gram' }} value={value} onChange={(next) => { setValue(next); onValue(next); }} />;
  }

  it('shows the person’s unit, keeps what was typed and gives °C', async () => {
    const onValue = vi.fn();
    render(<Field onValue={onValue} />);
    const input = screen.getByLabelText('Oil temperature');
    expect(input).toHaveValue('104');
    await userEvent.clear(input);
    await userEvent.type(input, '110,0');
    expect(input).toHaveValue('110,0');
    // 110 °F = 43.333… °C (conversion exact by definition).
    expect(onValue.mock.lastCall?.[0]).toBeCloseTo(43.3333333, 6);
  });

  it('says what would be right when it is no number, and loses nothing', async () => {
    render(<Field onValue={() => undefined} />);
    const input = screen.getByLabelText('Oil temperature');
    await userEvent.clear(input);
    await userEvent.type(input, 'warm');
    expect(input).toHaveValue('warm');
    expect(screen.getByText(/Type a number/)).toBeInTheDocument();
    expect(input).toHaveAttribute('aria-invalid', 'true');
  });
});

describe('Strip', () => {
  it('draws one piece per thing counted and says the count in words', () => {
    const { container } = render(<Strip label="2 of 3 found, 1 not looked at" pieces={[{ kind: 'found', severity: 3 }, { kind: 'found', severity: 1 }, { kind: 'not-checked' }]} />);
    expect(screen.getByRole('img', { name: '2 of 3 found, 1 not looked at' })).toBeInTheDocument();
    // Filled from below to severity in thirds: the whole height, then a third of it.
    expect([...container.querySelectorAll('.fill-more-fill')].map((rect) => Number(rect.getAttribute('height')))).toEqual([18, 6]);
  });
});

describe('Block', () => {
  it('says why it cannot be pressed', async () => {
    const onClick = vi.fn();
    render(<Block waitsFor="Scent waits for the check" onClick={onClick}>Scent in</Block>);
    await userEvent.click(screen.getByRole('button', { name: 'Scent waits for the check' }));
    expect(onClick).not.toHaveBeenCalled();
  });
});
