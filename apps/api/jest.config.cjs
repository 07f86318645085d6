const { databaseProject } = require('../cli/jest/projects.cjs');

module.exports = databaseProject('api', __dirname, { setupFiles: ['reflect-metadata'] });
