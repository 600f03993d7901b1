select `measure`, `value`
from `network_targets`;

select `target_margin_share` as `value`
from `network`;

select `branch_id` as `branchId`, `measure`, `value`
from (select * from branch_targets where branch_id in (select value from json_each(?))) as `branch_targets`;

select `id` as `branchId`, `target_margin_share` as `value`
from `branches`
where id in (select value from json_each(?)) and `target_margin_share` is not null;
