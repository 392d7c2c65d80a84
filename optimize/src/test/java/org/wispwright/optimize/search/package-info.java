/** Tests of the search, with published functions, tables and worked examples. */
package org.wispwright.optimize.search;
