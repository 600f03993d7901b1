select `target_margin_share` as `target`
from `network`;

select `target_margin_share` as `target`
from `branches`
where `id` = ?;
