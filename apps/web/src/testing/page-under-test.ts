import { provideHttpClient, withFetch, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { type Type } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter, Router, type Routes, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { problemInterceptor } from '../app/api/problem-interceptor';

/** A component on its own, with HTTP faked at the edge; `inputs` as its template would bind them. */
export async function showComponent<T>(component: Type<T>, inputs: Record<string, unknown> = {}) {
  provideFakes([]);
  const fixture = TestBed.createComponent(component);
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  return seen(fixture, fixture.nativeElement as HTMLElement);
}

/** Pages behind a router, opened at `address`. */
export async function openPage(routes: Routes, address: string) {
  provideFakes(routes);
  const harness = await RouterTestingHarness.create(address);
  return {
    harness,
    ...(await seen(harness.fixture, harness.fixture.nativeElement as HTMLElement)),
  };
}

function provideFakes(routes: Routes): void {
  TestBed.configureTestingModule({
    providers: [
      provideRouter(routes, withComponentInputBinding()),
      provideHttpClient(withFetch(), withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
    ],
  });
}

async function seen<T>(fixture: ComponentFixture<T>, page: HTMLElement) {
  /** Effects, answers and what follows from them. `whenStable` would wait for requests yet to be answered. */
  const settle = async (): Promise<void> => {
    for (let round = 0; round < 3; round++) {
      TestBed.tick();
      await new Promise((done) => setTimeout(done));
    }
    TestBed.tick();
  };
  await settle();
  return {
    fixture,
    page,
    http: TestBed.inject(HttpTestingController),
    router: TestBed.inject(Router),
    settle,
    /** Types into the field with that label. */
    type: (label: string, text: string): void => {
      const input = fieldIn(page, label);
      input.value = text;
      input.dispatchEvent(new Event(input instanceof HTMLSelectElement ? 'change' : 'input'));
    },
    /** The sentence under the field with that label. */
    faultOf: (label: string) =>
      fieldIn(page, label).closest('app-field')?.querySelector('.fault')?.textContent,
    /** Clicks natively: Material's harness would wait for the answer of the request. */
    press: (name: string): void => {
      const buttons = [...page.querySelectorAll<HTMLElement>('button, a')];
      const found = buttons.find((button) => button.textContent.trim() === name);
      if (!found) throw new Error(`There is no button or link "${name}".`);
      found.click();
    },
  };
}

function fieldIn(page: HTMLElement, label: string): HTMLInputElement | HTMLSelectElement {
  const labels = [...page.querySelectorAll('label')];
  const id = labels.find((one) => one.textContent.trim() === label)?.htmlFor ?? 'none';
  const field = page.querySelector<HTMLInputElement | HTMLSelectElement>(`#${id}`);
  if (!field) throw new Error(`There is no field "${label}".`);
  return field;
}
