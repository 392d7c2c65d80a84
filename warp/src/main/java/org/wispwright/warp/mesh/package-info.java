/**
 * Room: maps of the plane that follow a few dragged points and keep the shape between them.
 * <p>Doors: {@link org.wispwright.warp.mesh.MovingLeastSquares} (a map by formula, from any points),
 * {@link org.wispwright.warp.mesh.QuadGrid} (a grid of cells, and where it folds), {@link org.wispwright.warp.mesh.TriangleMesh} and
 * {@link org.wispwright.warp.mesh.AsRigidAsPossible} (a mesh whose parts turn but hardly stretch),
 * {@link org.wispwright.warp.mesh.HandledMesh} (a grid with corners at any places),
 * {@link org.wispwright.warp.mesh.MeshPainting} (where the place under each pixel was), {@link org.wispwright.warp.mesh.ClosestRotation}.
 * <p>Words: <i>rest</i> = the mesh before anything is dragged; <i>handle</i> = a corner of the mesh that is told where to be;
 * <i>free</i> = a corner that is not; <i>ring</i> = the corners joined to one by an edge; <i>fold</i> = a cell turned over.
 * <p>May use: EJML. Must not use: other rooms of ours. Held by {@code WallsTest}.
 */
package org.wispwright.warp.mesh;
