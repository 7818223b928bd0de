export const root: string;
export interface DemoEnvironment extends NodeJS.ProcessEnv {
  COILYARD_URL: string;
}
export function demoEnvironment(ports: {
  port: number;
  payPort: number;
  smtpPort: number;
  database: string;
}): DemoEnvironment;
export function freePorts(count: number): Promise<number[]>;
export function prepareDatabase(environment: DemoEnvironment): void;
export function startProduct(options: {
  environment: DemoEnvironment;
  payPort: number;
  smtpPort: number;
  mailPort: number;
  output?: number | 'inherit';
}): Promise<{ stop: () => Promise<void> }>;
