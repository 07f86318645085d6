const { databaseProject } = require('../apps/cli/jest/projects.cjs');

module.exports = databaseProject('db', __dirname);
