select `fee_micros` as `value`
from `network_fees`
where `from_date` <= ?
order by `from_date` desc
limit ?;

select `branches`.`code` as `key`, `hourly_cost_cents` as `value`
from (select * from branch_rates where branch_id in (select value from json_each(?))) as `branch_rates`
inner join `branches` on `branches`.`id` = `branch_rates`.`branch_id`
where `from_date` <= ?
order by `from_date` asc;

select `products`.`code` as `key`, `cost_per_litre_cents` as `value`
from `product_costs`
inner join `products` on `products`.`id` = `product_costs`.`product_id`
where `from_date` <= ?
order by `from_date` asc;

select `kind` as `key`, `unit_cost_cents` as `value`
from `consumable_costs`
where `from_date` <= ?
order by `from_date` asc;
