import fs from 'node:fs';
import path from 'node:path';
import { writeBrotliTwins } from '../brotli-twins.mjs';
import { ScriptFailure } from '../failure.mjs';
import { PROJECT_ROOT } from '../paths.mjs';
import { runTool } from '../processes.mjs';

const NAME = 'empty-page';

const MAIN = `import { provideHttpClient } from '@angular/common/http';
import { ChangeDetectionStrategy, Component, provideZonelessChangeDetection } from '@angular/core';
import { bootstrapApplication } from '@angular/platform-browser';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { MatToolbar } from '@angular/material/toolbar';
import { provideRouter, RouterOutlet } from '@angular/router';

@Component({
  selector: 'app-page',
  changeDetection: ChangeDetectionStrategy.OnPush,
  imports: [MatButton, MatIcon],
  template: '<button matButton="filled" type="button"><mat-icon svgIcon="press" />Press</button>',
})
class Page {}

@Component({
  selector: 'app-root',
  changeDetection: ChangeDetectionStrategy.OnPush,
  imports: [MatToolbar, RouterOutlet],
  template: '<mat-toolbar>Empty</mat-toolbar><router-outlet />',
})
class App {}

const routes = [{ path: '**', component: Page }];
void bootstrapApplication(App, {
  providers: [provideZonelessChangeDetection(), provideRouter(routes), provideHttpClient()],
});
`;

const STYLES = `@use '@angular/material' as mat;
html {
  color-scheme: light dark;
  @include mat.theme((
    color: (primary: mat.$spring-green-palette, tertiary: mat.$orange-palette, theme-type: color-scheme),
    typography: 'Work Sans',
    density: 0,
  ));
}
`;

const INDEX =
  '<!doctype html><html lang="en"><head><meta charset="utf-8"><title>Empty</title><base href="/"></head><body><app-root></app-root></body></html>\n';

/**
 * Builds an empty page of an application with Angular and Material: router, HTTP client, a toolbar, a button and an icon
 * under the product's theme call, with the product's own builder and options. Nobody who uses these gets below.
 * @param {import('../shutdown.mjs').Shutdown} shutdown
 * @returns {Promise<string>} the folder with its index.html and brotli twins; removed at the end
 */
export async function buildEmptyPage(shutdown) {
  // Inside the project, because that is where its packages are found from; below what Git ignores.
  const parent = path.join(PROJECT_ROOT, 'dist');
  fs.mkdirSync(parent, { recursive: true });
  const folder = fs.mkdtempSync(path.join(parent, '.bench-page-'));
  shutdown.add('The empty page', () => fs.rmSync(folder, { recursive: true, force: true, maxRetries: 5 }));
  fs.mkdirSync(path.join(folder, 'src'));
  const files = {
    'angular.json': JSON.stringify(workspace()),
    'package.json': JSON.stringify({ name: NAME, private: true }),
    'tsconfig.json': JSON.stringify(compilerOptions()),
    'src/main.ts': MAIN,
    'src/styles.scss': STYLES,
    'src/index.html': INDEX,
  };
  for (const [name, text] of Object.entries(files)) {
    fs.writeFileSync(path.join(folder, name), text);
  }
  const ng = path.join(PROJECT_ROOT, 'node_modules', '@angular', 'cli', 'bin', 'ng.js');
  const { code, output } = await runTool(process.execPath, [ng, 'build', '--configuration', 'production'], {
    cwd: folder,
    env: { ...process.env, NG_CLI_ANALYTICS: 'false' },
  });
  if (code !== 0) {
    throw new ScriptFailure(`The empty page does not build:\n${output.trim()}`);
  }
  const built = path.join(folder, 'out', 'browser');
  await writeBrotliTwins(built);
  return built;
}

function workspace() {
  const own = JSON.parse(fs.readFileSync(path.join(PROJECT_ROOT, 'angular.json'), 'utf8'));
  const { build } = own.projects.firstcold.architect;
  const production = { ...build.configurations.production, budgets: [] };
  const options = {
    browser: 'src/main.ts',
    index: 'src/index.html',
    tsConfig: 'tsconfig.json',
    outputPath: 'out',
    polyfills: build.options.polyfills,
    inlineStyleLanguage: 'scss',
    styles: ['src/styles.scss'],
  };
  const architect = { build: { builder: build.builder, options, configurations: { production } } };
  return {
    version: 1,
    cli: { analytics: false, cache: { enabled: false } },
    projects: { [NAME]: { projectType: 'application', root: '', sourceRoot: 'src', architect } },
  };
}

function compilerOptions() {
  const app = JSON.parse(fs.readFileSync(path.join(PROJECT_ROOT, 'frontend', 'tsconfig.app.json'), 'utf8'));
  const ownFolders = { outDir: 'out-tsc', rootDir: '.' };
  return {
    compilerOptions: {
      ...app.compilerOptions,
      ...ownFolders,
      target: 'ES2022',
      strict: true,
      skipLibCheck: true,
      isolatedModules: true,
    },
    angularCompilerOptions: app.angularCompilerOptions,
    files: ['src/main.ts'],
  };
}
