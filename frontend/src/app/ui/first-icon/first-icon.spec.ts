import { readFileSync } from 'node:fs';
import path from 'node:path';
import { TestBed } from '@angular/core/testing';
import { describe, expect, it } from '@jest/globals';
import { FirstIcon, type FirstIconName } from './first-icon';

const FILE = path.join(__dirname, '..', '..', '..', '..', 'public', 'icons.svg');
const set = new DOMParser().parseFromString(readFileSync(FILE, 'utf8'), 'image/svg+xml');

/** What a drawing is made of, whoever wrote its tags. */
const shapesOf = (drawing: Element | null): string[] =>
  [...(drawing?.querySelectorAll('path, circle') ?? [])].map((shape) =>
    ['d', 'cx', 'cy', 'r'].map((name) => shape.getAttribute(name) ?? '').join(' '),
  );

describe('FirstIcon', () => {
  it.each<FirstIconName>(['hide', 'person', 'show', 'waiting'])(
    'draws %s as the file of all icons',
    (name) => {
      const fixture = TestBed.createComponent(FirstIcon);
      fixture.componentRef.setInput('name', name);
      fixture.detectChanges();
      const shapes = shapesOf((fixture.nativeElement as HTMLElement).querySelector('svg'));
      expect(shapes.length).toBeGreaterThan(0);
      expect(shapes).toEqual(shapesOf(set.getElementById(name)));
    },
  );
});
