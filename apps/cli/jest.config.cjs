const { nodeProject } = require('../../apps/cli/jest/projects.cjs');

module.exports = nodeProject('cli', __dirname);
