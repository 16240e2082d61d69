import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterOutlet } from '@angular/router';
import { Shell } from './shell/shell';

/** The root: the shell around whatever page the address names. */
@Component({
  selector: 'app-root',
  imports: [RouterOutlet, Shell],
  changeDetection: ChangeDetectionStrategy.OnPush,
  template: '<app-shell><router-outlet /></app-shell>',
})
export class App {}
