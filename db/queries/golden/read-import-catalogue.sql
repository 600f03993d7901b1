select `code`, `name`
from `products`
order by `code` asc;

select `code`, `name`
from `packages`
order by `code` asc;
