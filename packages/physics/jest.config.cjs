const { nodeProject } = require('../../apps/cli/jest/projects.cjs');

module.exports = nodeProject('physics', __dirname);
