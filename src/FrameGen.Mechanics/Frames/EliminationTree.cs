namespace FrameGen.Mechanics.Frames;

/// <summary>
/// Elimination order with its tree in postorder, and the factor's pattern by columns; a "column" here is a node with its six freedoms.
/// </summary>
internal sealed class EliminationTree
{
    private EliminationTree(int[] order, int[] parents, int[][] rows) => (Order, Parents, Rows) = (order, parents, rows);

    /// <summary>Node at each place of the order.</summary>
    public int[] Order { get; }

    /// <summary>Parent column of each column, −1 at a root; every child comes before its parent, every subtree is one run.</summary>
    public int[] Parents { get; }

    /// <summary>Rows below the diagonal of each column, ascending.</summary>
    public int[][] Rows { get; }

    /// <summary>Builds the tree of an order (J. Liu, ACM Trans. Math. Softw. 12 (1986) 127) and its postorder.</summary>
    /// <param name="order">A permutation of the nodes.</param>
    /// <param name="starts">Offsets into <paramref name="neighbours"/>, one more than nodes.</param>
    /// <param name="neighbours">Symmetric adjacency.</param>
    public static EliminationTree Build(int[] order, int[] starts, int[] neighbours)
    {
        int n = order.Length;
        int[] parents = ParentsOf(order, Inverse(order), starts, neighbours);
        int[] post = Postorder(parents, Sizes(order, parents, starts, neighbours));

        int[] newPlace = Inverse(post);
        int[] newOrder = new int[n];
        int[] newParents = new int[n];
        for (int k = 0; k < n; k++)
        {
            newOrder[k] = order[post[k]];
            newParents[k] = parents[post[k]] < 0 ? -1 : newPlace[parents[post[k]]];
        }

        return new EliminationTree(newOrder, newParents, Patterns(newOrder, newParents, starts, neighbours));
    }

    /// <summary>Multiplications that a factor in some order takes, about: half a front's square for each of its freedoms.</summary>
    public static double WorkOf(int[] order, int[] starts, int[] neighbours)
    {
        int[] parents = ParentsOf(order, Inverse(order), starts, neighbours);
        return Sizes(order, parents, starts, neighbours).Sum(rows => 108.0 * (rows + 1) * (rows + 1));
    }

    /// <summary>The inverse of a permutation.</summary>
    public static int[] Inverse(int[] permutation)
    {
        int[] inverse = new int[permutation.Length];
        for (int k = 0; k < permutation.Length; k++)
        {
            inverse[permutation[k]] = k;
        }

        return inverse;
    }

    private static int[] ParentsOf(int[] order, int[] place, int[] starts, int[] neighbours)
    {
        int n = order.Length;
        int[] parents = new int[n];
        int[] ancestors = new int[n];
        for (int k = 0; k < n; k++)
        {
            (parents[k], ancestors[k]) = (-1, -1);
            for (int a = starts[order[k]]; a < starts[order[k] + 1]; a++)
            {
                int i = place[neighbours[a]];
                while (i >= 0 && i < k)
                {
                    int above = ancestors[i];
                    ancestors[i] = k;
                    if (above < 0)
                    {
                        parents[i] = k;
                    }

                    i = above;
                }
            }
        }

        return parents;
    }

    /// <summary>Number of rows of each column of the factor, by walking each row's subtree.</summary>
    private static int[] Sizes(int[] order, int[] parents, int[] starts, int[] neighbours)
    {
        int n = order.Length;
        int[] place = Inverse(order);
        int[] sizes = new int[n];
        int[] mark = new int[n];
        Array.Fill(mark, -1);
        for (int k = 0; k < n; k++)
        {
            mark[k] = k;
            for (int a = starts[order[k]]; a < starts[order[k] + 1]; a++)
            {
                for (int i = place[neighbours[a]]; i < k && mark[i] != k; i = parents[i])
                {
                    mark[i] = k;
                    sizes[i]++;
                }
            }
        }

        return sizes;
    }

    /// <summary>Postorder without recursion; of two siblings the one with the longer column comes last, next to its parent.</summary>
    private static int[] Postorder(int[] parents, int[] sizes)
    {
        int n = parents.Length;
        int[] bySize = [.. Enumerable.Range(0, n).OrderByDescending(k => sizes[k]).ThenBy(k => k)];
        int[] firstChild = new int[n + 1];
        int[] nextSibling = new int[n];
        Array.Fill(firstChild, -1);
        foreach (int k in bySize)
        {
            int parent = parents[k] < 0 ? n : parents[k];
            (nextSibling[k], firstChild[parent]) = (firstChild[parent], k);
        }

        int[] post = new int[n];
        int count = 0;
        var path = new Stack<int>();
        path.Push(n);
        while (path.Count > 0)
        {
            int top = path.Peek();
            int child = firstChild[top];
            if (child >= 0)
            {
                firstChild[top] = nextSibling[child];
                path.Push(child);
            }
            else
            {
                path.Pop();
                if (top < n)
                {
                    post[count++] = top;
                }
            }
        }

        return post;
    }

    private static int[][] Patterns(int[] order, int[] parents, int[] starts, int[] neighbours)
    {
        int n = order.Length;
        int[] place = Inverse(order);
        int[][] rows = new int[n][];
        var children = new List<int>[n];
        int[] mark = new int[n];
        Array.Fill(mark, -1);
        var pattern = new List<int>();
        for (int k = 0; k < n; k++)
        {
            pattern.Clear();
            mark[k] = k;
            for (int a = starts[order[k]]; a < starts[order[k] + 1]; a++)
            {
                Add(place[neighbours[a]]);
            }

            if (children[k] is { } below)
            {
                foreach (int child in below)
                {
                    foreach (int i in rows[child])
                    {
                        Add(i);
                    }
                }
            }

            pattern.Sort();
            rows[k] = [.. pattern];
            if (parents[k] >= 0)
            {
                (children[parents[k]] ??= []).Add(k);
            }

            void Add(int i)
            {
                if (i > k && mark[i] != k)
                {
                    mark[i] = k;
                    pattern.Add(i);
                }
            }
        }

        return rows;
    }
}
