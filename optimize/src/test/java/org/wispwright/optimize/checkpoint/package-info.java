/** Tests of the reversal with few snapshots: published counts, and a chain that checks every call. */
package org.wispwright.optimize.checkpoint;
