export { TablePage as Component } from './components/table-page';
