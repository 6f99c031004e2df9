import type { Page } from 'playwright-core';
import type { Product } from './product';

/** Invented people of the demo, as the service seeds them. */
export const people = {
  scientist: { email: 'scientist@siltlight.example', name: 'Ilka Vossberg' },
  scientist2: { email: 'scientist2@siltlight.example', name: 'Tomas Arnhult' },
  steward: { email: 'steward@siltlight.example', name: 'Mirela Castag' },
  steward2: { email: 'steward2@siltlight.example', name: 'Joren Quade' },
  modeller: { email: 'modeller@siltlight.example', name: 'Pia Lindroth' },
  administrator: { email: 'admin@siltlight.example', name: 'Edo Marwick' },
} as const;

export type PersonKey = keyof typeof people;

export async function fillSignIn(page: Page, email: string, password: string): Promise<void> {
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
}

/** Signs in through the page, as the person would, and waits for the page that was wanted. */
export async function signIn(page: Page, product: Product, who: PersonKey, path = '/desk'): Promise<void> {
  await page.goto(product.url + path);
  await fillSignIn(page, people[who].email, product.password);
  await page.getByRole('button', { name: `${people[who].name}: menu` }).waitFor();
  await page.getByRole('heading', { level: 1 }).waitFor();
}
