export { QuantitiesPage as Component } from './components/quantities-page';
