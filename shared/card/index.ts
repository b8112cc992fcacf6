export * from './cautions.js';
export * from './cut-list.js';
export * from './forge-card.js';
export * from './stack-recipe.js';
export * from './tolerance.js';
