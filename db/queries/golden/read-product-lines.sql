select `package_id` as `packageId`, `body_type` as `bodyType`, `product_id` as `productId`, json_group_array(ml) as ml, json_group_array(temperature_c) as temperatures, coalesce(sum(cost_cents), 0) as "costCents", count(cost_cents) as "costedLines"
from (select * from job_products where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?))
group by `package_id`, `body_type`, `product_id`;
