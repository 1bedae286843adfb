import type { DemoSignIn } from '../features/welcome/knownSignIns';

/** The invented people of the demo laboratory. Their passwords are shown to everybody: they exist in the demo only. */
export const demoSignIns = [
  { role: 'technician', name: 'Ina Felsberg', email: 'ina@osierbank.example', password: 'technician-demo' },
  { role: 'reviewer', name: 'Tobit Marrow', email: 'tobit@osierbank.example', password: 'reviewer-demo' },
  { role: 'manager', name: 'Oda Quist', email: 'oda@osierbank.example', password: 'manager-demo' },
  { role: 'client', name: 'Pella Varr', email: 'pella@lanternhill.example', password: 'client-demo' },
] as const satisfies readonly DemoSignIn[];

/** The demo's person of a role. */
export function demoPerson(role: DemoSignIn['role']): DemoSignIn {
  const person = demoSignIns.find((signIn) => signIn.role === role);
  if (!person) throw new Error(`The demo has nobody in the role ${role}.`);
  return person;
}
