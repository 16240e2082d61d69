import { bootstrapApplication } from '@angular/platform-browser';
import { App } from './app/app';
import { APP_CONFIG } from './app/app.config';

// Should this fail there is no page to show it on; the browser's own log has it.
void bootstrapApplication(App, APP_CONFIG);
