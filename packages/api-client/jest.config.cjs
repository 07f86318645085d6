const { nodeProject } = require('../../apps/cli/jest/projects.cjs');

module.exports = nodeProject('api-client', __dirname);
