const { nodeProject } = require('../../apps/cli/jest/projects.cjs');

module.exports = nodeProject('recipe-model', __dirname);
