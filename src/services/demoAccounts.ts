import accounts from '../demo/accounts.json';

export interface DemoAccount {
  email: string;
  password: string;
  name: string;
  role: string;
  group: string;
}

/** The demo sign-ins to show on the sign-in page; none where `DEMO` is 0. */
export function demoAccounts(env: NodeJS.ProcessEnv): DemoAccount[] {
  return env.DEMO === '0' ? [] : accounts;
}
