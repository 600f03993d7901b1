select job_facts.branch_id as "branchId", job_facts.package_id * 8 + job_facts.age_band as key, job_products.product_id as "productId", sum(job_products.ml) as ml
from (select * from job_facts where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_facts`
inner join (select * from job_products where branch_id in (select value from json_each(?)) and gen_from <= (select generation from network) and gen_to > (select generation from network)) as `job_products` on `job_products`.`branch_id` = `job_facts`.`branch_id` and `job_products`.`completed_on` = `job_facts`.`completed_on` and `job_products`.`job_id` = `job_facts`.`job_id`
inner join `norms` on `norms`.`package_id` = `job_facts`.`package_id` and `norms`.`body_type` = `job_facts`.`body_type` and `norms`.`product_id` = `job_products`.`product_id`
where `job_facts`.`completed_on` >= ? and `job_facts`.`completed_on` <= ? and job_facts.package_id in (select value from json_each(?)) and job_facts.body_type in (select value from json_each(?)) and `job_facts`.`norm_ml` > ?
group by 1, 2, 3;
