/**
 * What a spec gets for `@angular/core/testing`: the same, with its environment set up. A spec of plain functions asks for
 * neither, and is spared Angular, its compiler and its renderer: most specs here.
 */
module.exports = require('angular-testing-itself');
const { setupZonelessTestEnv } = require('jest-preset-angular/setup-env/zoneless');

setupZonelessTestEnv({ errorOnUnknownElements: true, errorOnUnknownProperties: true });
