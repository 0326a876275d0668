export { RulePage as Component } from './components/rule-page';
