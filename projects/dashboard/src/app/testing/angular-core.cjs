/** What a spec gets for `@angular/core`: the same, with the compiler that libraries under jest still need. */
require('@angular/compiler');
module.exports = require('angular-core-itself');
