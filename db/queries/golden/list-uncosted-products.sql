select `products`.`code` as `code`, min(`completed_on`) as `on`
from (select * from job_products where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
inner join `products` on `products`.`id` = `job_facts`.`product_id`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and `cost_cents` is null
group by `products`.`code`
order by `products`.`code` asc;
