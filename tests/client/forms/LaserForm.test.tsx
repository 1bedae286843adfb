import { zodResolver } from '@hookform/resolvers/zod';
import { fireEvent, render, screen, waitFor } from '@testing-library/react-native';
import { useForm } from 'react-hook-form';
import { View } from 'react-native';
import type { z } from 'zod';
import { LaserFields } from '@/components/benches/LaserFields';
import { Button } from '@/components/ui/Button';
import { ApiProblem } from '@/hooks/api/ApiProblem';
import { useSubmit } from '@/hooks/forms/useSubmit';
import { laserBody, type LaserBody } from '@/shared/contracts/benches';

function Form({ send }: { send: (body: LaserBody) => Promise<void> }) {
  const form = useForm<z.input<typeof laserBody>, unknown, LaserBody>({
    resolver: zodResolver(laserBody),
    defaultValues: { name: '', serial: '', powerMw: null, note: '' },
  });
  const { submit, problem } = useSubmit(form, send, () => undefined);
  return (
    <View>
      <LaserFields control={form.control} />
      <Button label="Add the laser" onPress={submit} testID="save" />
      {problem ? <Button label={problem.message} testID="problem" /> : null}
    </View>
  );
}

function fillIn() {
  fireEvent.changeText(screen.getByTestId('name'), 'HN-0231');
  fireEvent.changeText(screen.getByTestId('wavelengthNm'), '632,8');
  fireEvent.changeText(screen.getByTestId('wavelengthUncertaintyNm'), '0.01');
  fireEvent.press(screen.getByTestId('laserClass'));
  fireEvent.press(screen.getByText('Class 2'));
}

test('an empty form says at each field what to enter, with its unit', async () => {
  const send = jest.fn(() => Promise.resolve());
  render(<Form send={send} />);
  fireEvent.press(screen.getByTestId('save'));
  await screen.findByText('Enter a name for the laser.');
  expect(screen.getByText('Enter the wavelength in nm as a number.')).toBeTruthy();
  expect(screen.getByText('Enter the uncertainty of the wavelength in nm as a number.')).toBeTruthy();
  expect(screen.getByText('Choose the class printed on the label.')).toBeTruthy();
  expect(send).not.toHaveBeenCalled();
});

test('what is no number is not sent', async () => {
  const send = jest.fn(() => Promise.resolve());
  render(<Form send={send} />);
  fillIn();
  fireEvent.changeText(screen.getByTestId('wavelengthNm'), '63x');
  fireEvent.press(screen.getByTestId('save'));
  await screen.findByText('Enter the wavelength in nm as a number.');
  expect(send).not.toHaveBeenCalled();
});

test('a filled form is sent as numbers; what was left empty is null', async () => {
  const send = jest.fn(() => Promise.resolve());
  render(<Form send={send} />);
  fillIn();
  fireEvent.press(screen.getByTestId('save'));
  await waitFor(() =>
    expect(send).toHaveBeenCalledWith({
      name: 'HN-0231',
      serial: '',
      wavelengthNm: 632.8,
      wavelengthUncertaintyNm: 0.01,
      laserClass: '2',
      powerMw: null,
      note: '',
    }),
  );
});

test('what the server finds wrong with a field stands at that field', async () => {
  const problem = new ApiProblem('invalid', 'Not valid.', 'id1', { name: 'There is a laser of that name.' }, 400);
  render(<Form send={() => Promise.reject(problem)} />);
  fillIn();
  fireEvent.press(screen.getByTestId('save'));
  await screen.findByText('There is a laser of that name.');
  expect(screen.queryByTestId('problem')).toBeNull();
});

test('a problem of the whole form is shown with what happened', async () => {
  const problem = new ApiProblem('network', 'No answer from the laboratory’s server.', null, {}, null);
  render(<Form send={() => Promise.reject(problem)} />);
  fillIn();
  fireEvent.press(screen.getByTestId('save'));
  await screen.findByText('No answer from the laboratory’s server.');
});
