import vm from 'node:vm';
import { TestEnvironment } from 'jest-environment-node';

/**
 * Jest's Node environment on a plain context. Jest makes its context around a proxy, through which every use of a
 * global (Math, Number, NaN) goes; arithmetic under test takes several times as long there.
 */
export default class PlainContextEnvironment extends TestEnvironment {
  constructor(config, context) {
    const { createContext } = vm;
    vm.createContext = () => createContext(vm.constants.DONT_CONTEXTIFY);
    try {
      super(config, context);
    } finally {
      vm.createContext = createContext;
    }
  }
}
