import { describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { ClosedJoint } from './closed-joint';

describe('ClosedJoint', () => {
  it('holds the name between two ends of pipe', async () => {
    const fixture = TestBed.createComponent(ClosedJoint);
    fixture.componentRef.setInput('name', 'Dale Whitcomb');
    await fixture.whenStable();
    const root = fixture.nativeElement as HTMLElement;
    expect([...root.children].map((child) => child.textContent?.trim())).toEqual(['', 'Dale Whitcomb', '']);
  });
});
