"""34-digit exact Gaussian ln L of the models in ../exactLikelihood34.json: near-unit AR and MA roots, MA roots on the circle,
seasons, differences, gaps at the ends, in runs and scattered. Reads the cases from the file and writes `exact` back into it.

By the definition: autocovariances from the linear system of Brockwell & Davis (Time Series: Theory and Methods, 2nd ed.,
section 3.3), dense covariance of the differenced record, Cholesky factor; missing readings integrated out with a flat prior.
Needs Python 3 and mpmath (Debian: python3-mpmath; made with mpmath 1.2.1). Run in this folder: python3 exactLikelihood34.py
"""
import json
import mpmath as mp

mp.mp.dps=34
def mult(a,b,s,sign):
    L=[mp.mpf(1)]+[-sign*mp.mpf(x) for x in a]; R=[mp.mpf(0)]*(len(b)*s+1); R[0]=mp.mpf(1)
    for j,x in enumerate(b): R[(j+1)*s]=-sign*mp.mpf(x)
    P=[mp.mpf(0)]*(len(L)+len(R)-1)
    for i,x in enumerate(L):
        for j,y in enumerate(R): P[i+j]+=x*y
    return [-sign*x for x in P[1:]]
def acv(ar,ma,m):
    p=len(ar); th=[mp.mpf(1)]+ma; psi=[]
    for j in range(len(th)):
        psi.append(th[j]+sum(ar[i-1]*psi[j-i] for i in range(1,min(p,j)+1)))
    right=lambda k: sum((th[j]*psi[j-k] for j in range(k,len(th))),mp.mpf(0))
    if p>0:
        A=mp.matrix(p+1,p+1); b=mp.matrix(p+1,1)
        for k in range(p+1):
            A[k,k]+=1; b[k]=right(k)
            for i in range(1,p+1): A[k,abs(k-i)]-=ar[i-1]
        g=list(mp.lu_solve(A,b))
    else: g=[right(0)]
    for k in range(len(g),m+1): g.append(right(k)+sum(ar[i-1]*g[k-i] for i in range(1,p+1)))
    return g
def diffpoly(o):
    c=[mp.mpf(1)]
    def once(c,l):
        r=c+[mp.mpf(0)]*l
        for i,x in enumerate(c): r[i+l]-=x
        return r
    for _ in range(o['d']): c=once(c,1)
    for _ in range(o['D']): c=once(c,o['s'])
    return c
def ll(case):
    o=case['order'];at=case['at']
    ar=mult(at['ar'],at['seasonalAr'],o['s'],1);ma=mult(at['ma'],at['seasonalMa'],o['s'],-1)
    c=diffpoly(o);m=len(c)-1;v=case['values'];n=len(v);N=n-m
    col=lambda y:[sum(c[i]*y[t+m-i] for i in range(m+1) if c[i]!=0) for t in range(N)]
    y=[mp.mpf(x) if x is not None else mp.mpf(0) for x in v]
    g=acv(ar,ma,N)
    L=mp.cholesky(mp.matrix(N,N)+mp.matrix([[g[abs(i-j)] for j in range(N)] for i in range(N)]))
    def white(x):
        z=[]
        for i in range(N):
            z.append((x[i]-mp.fdot([(L[i,k],z[k]) for k in range(i)]))/L[i,i])
        return z
    ld=sum(2*mp.log(L[i,i]) for i in range(N))
    r=white(col(y)); basis=[];lg=mp.mpf(0);rank=0
    for t in range(n):
        if v[t] is None:
            x=white(col([mp.mpf(1) if u==t else mp.mpf(0) for u in range(n)]))
            w=mp.fdot(x,x)
            for u in basis:
                a=mp.fdot(x,u); x=[p-a*q for p,q in zip(x,u)]
            l=mp.fdot(x,x)
            if l<mp.mpf('1e-25')*w: continue
            rank+=1; lg+=mp.log(l); s=mp.sqrt(l); basis.append([p/s for p in x])
    for u in basis:
        a=mp.fdot(r,u); r=[p-a*q for p,q in zip(r,u)]
    used=N-rank; s2=mp.mpf(at['innovationVariance'])
    return -(used*mp.log(2*mp.pi*s2)+ld+lg+mp.fdot(r,r)/s2)/2


path = '../exactLikelihood34.json'
cases = json.load(open(path))
for case in cases:
    case['exact'] = float(mp.nstr(ll(case), 20))
with open(path, 'w') as out:
    out.write('[\n' + ',\n'.join(json.dumps(case) for case in cases) + '\n]\n')
