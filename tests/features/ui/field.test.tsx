import { fireEvent, render, screen } from '@testing-library/react';
import { Button, Checkbox, Field, Form, RadioGroup, Select } from '@/features/ui';

const nothing = () => undefined;

describe('Field', () => {
  it('ties its error and its hint to the control', () => {
    render(<Field label="Period" value="2.35" onChangeText={nothing} error="times add up to 2.31" hint="3 digits" />);
    const input = screen.getByLabelText('Period');
    const described = (input.getAttribute('aria-describedby') ?? '').split(' ');
    expect(described.map((id) => document.getElementById(id)?.textContent)).toEqual([
      'times add up to 2.31',
      '3 digits',
    ]);
    expect(input.getAttribute('aria-invalid')).toBe('true');
  });

  it('is not invalid without an error', () => {
    render(<Field label="Period" value="" onChangeText={nothing} optional />);
    const input = screen.getByLabelText(/Period/);
    expect(input.hasAttribute('aria-invalid')).toBe(false);
    expect(input.hasAttribute('aria-describedby')).toBe(false);
  });

  it('sends its form on Enter', () => {
    const onSubmit = jest.fn();
    render(
      <Form name="Sign in" onSubmit={onSubmit}>
        <Field label="E-mail" value="" onChangeText={nothing} />
        <Button submit>Sign in</Button>
      </Form>,
    );
    fireEvent.submit(screen.getByRole('form', { name: 'Sign in' }));
    expect(onSubmit).toHaveBeenCalledTimes(1);
  });
});

describe('Button', () => {
  it('that can not be used says why, stays reachable and does nothing', () => {
    const onPress = jest.fn();
    render(
      <Button onPress={onPress} disabledBecause="Checked by an older engine.">
        Accept
      </Button>,
    );
    const button = screen.getByRole('button', { name: 'Accept', description: 'Checked by an older engine.' });
    fireEvent.click(button);
    expect(onPress).not.toHaveBeenCalled();
    expect(button.hasAttribute('disabled')).toBe(false);
  });
});

describe('choices', () => {
  it('report what was chosen', () => {
    const chosen: unknown[] = [];
    render(
      <>
        <Checkbox label="saddle" detail="12" checked={false} onChange={(value) => chosen.push(value)} />
        <Select
          label="Section"
          value="z-27"
          options={[
            { value: 'z-27', label: 'z − 27' },
            { value: 'x', label: 'x' },
          ]}
          onChange={(value) => chosen.push(value)}
        />
        <RadioGroup
          legend="Decision"
          value={null}
          options={[
            { value: 'accept', label: 'Accept' },
            { value: 'return', label: 'Return', disabledBecause: 'You own this submission.' },
          ]}
          onChange={(value) => chosen.push(value)}
        />
      </>,
    );
    fireEvent.click(screen.getByRole('checkbox', { name: 'saddle', description: '12' }));
    fireEvent.change(screen.getByLabelText('Section'), { target: { value: 'x' } });
    fireEvent.click(screen.getByRole('radio', { name: 'Accept' }));
    expect(chosen).toEqual([true, 'x', 'accept']);
    expect(screen.getByRole('radio', { name: 'Return', description: 'You own this submission.' })).toHaveProperty(
      'disabled',
      true,
    );
    expect(screen.getByRole('group', { name: 'Decision' })).toBeTruthy();
  });
});
